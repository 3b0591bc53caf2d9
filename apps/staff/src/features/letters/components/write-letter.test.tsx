import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { cleanup, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import type { LetterView } from "@withy/contracts/letters";
import { ChangesProvider } from "@withy/ui/recent-changes";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { ShortcutProvider } from "@/components/shortcuts/shortcut-provider";
import { LetterPage } from "./letter-page";

vi.mock("next/navigation", () => ({ useRouter: () => ({ push: vi.fn() }), usePathname: () => "/letters/1" }));

const source = { kind: "measure" as const, id: "m1", label: "Pain, 1 Dec" };
const sentence = (id: string, text: string, more = {}) => ({
  id,
  text,
  source,
  assembled: text,
  actor: null,
  keptBecause: null,
  ...more,
});

const letter: LetterView = {
  id: "letter-1",
  title: "Discharge from physiotherapy",
  reference: "L-7KX2QD",
  state: "draft",
  version: 1,
  datedOn: "2026-12-01",
  zone: "Europe/London",
  patient: {
    id: "p1",
    name: "Eleri Tamworth",
    bornOn: "1963-06-22",
    nhsNumber: "9993142786",
    addressLines: ["9 Kelp Street"],
    email: "eleri@post.example",
  },
  episode: { id: "e1", problem: "Hip osteoarthritis", place: "Left hip", state: "open", version: 4 },
  author: { id: "s1", name: "Nia Prosser", jobTitle: "physiotherapist" },
  sender: { practice: "Marram Physiotherapy", siteLine: "Saltgate", contactLine: "01632 960110" },
  recipient: {
    kind: "gp",
    name: "Dr Hanne Pryor",
    addressLines: ["Quayside Surgery"],
    email: "quayside@surgery.example",
  },
  sections: [
    {
      key: "plan",
      heading: "Plan and requested actions",
      sentences: [sentence("plan:gp", "No action is asked of you.", { actor: "gp" })],
    },
    { key: "scales", heading: "Assessment scales", sentences: [sentence("scales:pain", "Pain: 6.")] },
  ],
  stale: [],
  missing: [],
  checks: [{ key: "recipient", isOk: true, blocks: true, words: "To Dr Hanne Pryor" }],
  canWrite: true,
  canSend: false,
  updatedAt: "2026-12-01T10:42:00Z",
  signedAt: null,
  signedName: null,
  registrationNumber: null,
  deliveries: [],
};

interface Call {
  readonly method: string;
  readonly path: string;
  readonly body: Record<string, unknown>;
}
let calls: Call[] = [];
let answer: (call: Call) => { status: number; body: unknown };

beforeEach(() => {
  calls = [];
  answer = ({ body }) => ({ status: 200, body: { ...letter, version: Number(body.version ?? 1) + 1 } });
  vi.stubGlobal("fetch", async (path: string, init: RequestInit = {}) => {
    const call = { method: init.method ?? "GET", path, body: init.body ? JSON.parse(String(init.body)) : {} };
    calls.push(call);
    const { status, body } = answer(call);
    return new Response(JSON.stringify(body), { status, headers: { "content-type": "application/json" } });
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function show(view: LetterView = letter) {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  return render(
    <QueryClientProvider client={client}>
      <ChangesProvider>
        <ShortcutProvider>
          <LetterPage letter={view} />
        </ShortcutProvider>
      </ChangesProvider>
    </QueryClientProvider>,
  );
}
const saved = () => within(screen.getByRole("complementary")).getByRole("status").textContent;
const writes = () => calls.filter((call) => call.method !== "GET");
const type = (name: string, text: string) =>
  fireEvent.change(screen.getByRole("textbox", { name }), { target: { value: text } });
const problem = (code: string, detail: string, status: number, fields: unknown[] = []) => ({
  status,
  body: { type: "", title: "", status, detail, code, kind: code, fields, requestId: "r", more: {} },
});

describe("writing a letter", () => {
  it("saves what was typed by itself, words and actor only, and says so", async () => {
    show();
    type("Assessment scales, sentence 1", "Pain is less.");
    expect(saved()).toBe("Not saved yet");
    await waitFor(() => expect(writes().length).toBe(1), { timeout: 3_000 });
    expect(writes()[0]).toMatchObject({ method: "PUT", path: "/api/letters/letter-1", body: { version: 1 } });
    expect(writes()[0]?.body["sections"]).toEqual([
      { key: "plan", sentences: [{ id: "plan:gp", text: "No action is asked of you.", actor: "gp" }] },
      { key: "scales", sentences: [{ id: "scales:pain", text: "Pain is less.", actor: null }] },
    ]);
    await waitFor(() => expect(saved()).toBe("Saved"));
  });

  it("keeps what was typed when the save is refused, says why, and tries again", async () => {
    answer = () => problem("unavailable", "Withy could not be reached.", 503);
    show();
    type("Assessment scales, sentence 1", "Pain is less.");
    expect((await screen.findByRole("alert", {}, { timeout: 3_000 })).textContent).toContain(
      "Not saved. Withy could not be reached.",
    );
    expect(
      screen.getByRole<HTMLTextAreaElement>("textbox", { name: "Assessment scales, sentence 1" }).value,
    ).toBe("Pain is less.");
    answer = ({ body }) => ({ status: 200, body: { ...letter, version: Number(body.version) + 1 } });
    fireEvent.click(screen.getByRole("button", { name: "Save again" }));
    await waitFor(() => expect(saved()).toBe("Saved"));
    expect(writes().length).toBe(2);
  });

  it("leaves an emptied sentence out, and puts it back", () => {
    show();
    type("Assessment scales, sentence 1", "");
    const field = screen.getByRole<HTMLTextAreaElement>("textbox", { name: "Assessment scales, sentence 1" });
    expect(field.placeholder).toBe("Left out: Pain: 6.");
    fireEvent.click(screen.getByRole("button", { name: /Put back/ }));
    expect(field.value).toBe("Pain: 6.");
  });

  it("shows a sentence out of date, and asks for the record's words in the saved version", async () => {
    show({ ...letter, stale: [{ id: "scales:pain", now: "Pain: 2.", source }] });
    expect(screen.getByRole("textbox", { name: "Assessment scales, sentence 1, out of date" })).toBeTruthy();
    expect(screen.getByText("The record now says: Pain: 2.")).toBeTruthy();
    fireEvent.click(screen.getByRole("button", { name: "Put it in" }));
    await waitFor(() => expect(writes().length).toBe(1));
    expect(writes()[0]).toMatchObject({
      path: "/api/letters/letter-1/sentences",
      body: { version: 1, sentenceId: "scales:pain", choice: "take" },
    });
  });
});

describe("signing a letter", () => {
  const sign = async () => {
    fireEvent.click(screen.getByRole("button", { name: /Sign and send…/ }));
    return within(await screen.findByRole("dialog", {}, { timeout: 10_000 }));
  };

  it("asks how the episode ended before anything is written", async () => {
    show();
    const dialog = await sign();
    fireEvent.click(dialog.getByRole("button", { name: "Sign and send" }));
    expect(dialog.getAllByText("Choose how the episode ended.").length).toBeGreaterThan(0);
    expect(writes()).toEqual([]);
  });

  it("saves first, signs with the episode's end, then sends, in that order", async () => {
    show();
    type("Assessment scales, sentence 1", "Pain is less.");
    const dialog = await sign();
    fireEvent.click(dialog.getByLabelText("Goals met"));
    fireEvent.click(dialog.getByRole("button", { name: "Sign and send" }));
    await waitFor(() =>
      expect(writes().map((call) => call.path)).toEqual([
        "/api/letters/letter-1",
        "/api/letters/letter-1/sign",
        "/api/letters/letter-1/send",
      ]),
    );
    expect(writes()[1]?.body).toEqual({ version: 2, discharge: { version: 4, outcome: "goals-met" } });
    expect(writes()[2]?.body).toEqual({ to: "recipient", channel: "email" });
  });

  it("shows the refusal in the dialog and sends nothing", async () => {
    answer = ({ path }) =>
      path.endsWith("/sign")
        ? problem("refused", "One note is not signed.", 409)
        : { status: 200, body: letter };
    show();
    const dialog = await sign();
    fireEvent.click(dialog.getByLabelText("Discharge with this letter"));
    fireEvent.click(dialog.getByRole("button", { name: "Sign and send" }));
    expect(await dialog.findByText("One note is not signed.")).toBeTruthy();
    expect(writes().map((call) => call.path)).toEqual(["/api/letters/letter-1/sign"]);
  });
});

describe("a letter that is not one's own to write", () => {
  it("is read, not typed in", () => {
    show({ ...letter, canWrite: false });
    expect(screen.queryByRole("textbox")).toBeNull();
    expect(screen.getByText(/Only its writer changes and signs it/)).toBeTruthy();
  });
});
