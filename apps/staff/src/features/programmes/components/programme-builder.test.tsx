import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { cleanup, fireEvent, render, screen, waitFor, within } from "@testing-library/react";
import { emptyProgramme, newItems } from "@withy/clinical/programmes/new-item";
import type { ProgrammeView } from "@withy/contracts/programmes";
import { ChangesProvider } from "@withy/ui/recent-changes";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { ShortcutProvider } from "@/components/shortcuts/shortcut-provider";
import { ProgrammeBuilder } from "./programme-builder";

vi.mock("next/navigation", () => ({ useRouter: () => ({ push: vi.fn() }), usePathname: () => "/exercises" }));

// The dialogs are fetched when they are first opened.

let line = 0;
const items = (...keys: string[]) => keys.flatMap((key) => newItems(key, "timed", () => `line-${++line}`));

const hipSession: ProgrammeView = {
  id: "p1",
  title: "Programme 1",
  patient: { id: "x1", name: "Eleri Tamworth", bornOn: "1963-06-22", age: 63, nhsNumber: null, alerts: [] },
  calledName: "Ellie",
  episode: { id: "e1", problem: "Hip osteoarthritis", place: "Left hip", isOpen: true },
  sender: { practice: "Marram Physiotherapy", site: "Saltgate", phone: "01632 960110" },
  zone: "Europe/London",
  versionNumber: 1,
  currentVersion: 1,
  isIssued: false,
  canWrite: true,
  content: { ...emptyProgramme, items: items("sit-to-stand", "step-up", "bridge") },
  sessionSeconds: 480,
  weekSeconds: 1440,
  versions: [
    {
      versionNumber: 1,
      savedAt: "2026-12-01T10:42:00Z",
      savedBy: "Nia Prosser",
      issuedAt: null,
      issuedBy: null,
    },
  ],
  version: 1,
};

/** What the server holds: it saves with the right version, and answers "stale" with any other. */
let held: ProgrammeView;
let saves: ProgrammeView["content"][];

function serve(path: string, init: RequestInit = {}): { status: number; body: unknown } {
  const body = init.body ? JSON.parse(String(init.body)) : {};
  if (init.method === "PUT") {
    if (body.version !== held.version)
      return { status: 412, body: problem("stale", "Someone else changed this programme.") };
    held = { ...held, title: body.title, content: body.content, version: held.version + 1 };
    saves.push(body.content);
  }
  if (path.endsWith("/issue")) held = { ...held, isIssued: true, version: held.version + 1 };
  return { status: 200, body: held };
}

const problem = (code: string, detail: string) => ({
  code,
  kind: code,
  detail,
  status: 412,
  fields: [],
  more: {},
});

beforeEach(() => {
  held = hipSession;
  saves = [];
  vi.stubGlobal("fetch", async (path: string, init: RequestInit) => {
    const { status, body } = serve(path, init);
    return new Response(JSON.stringify(body), { status });
  });
  vi.stubGlobal("open", vi.fn());
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function show(view: ProgrammeView = hipSession) {
  render(
    <QueryClientProvider client={new QueryClient()}>
      <ChangesProvider>
        <ShortcutProvider>
          <ProgrammeBuilder first={view} />
        </ShortcutProvider>
      </ChangesProvider>
    </QueryClientProvider>,
  );
}

const total = () => screen.getByLabelText("Session time").textContent;
const names = () => [...document.querySelectorAll(".items .name b")].map((name) => name.textContent);
const press = (name: string | RegExp) => fireEvent.click(screen.getByRole("button", { name }));
const saved = (times: number) => waitFor(() => expect(saves).toHaveLength(times));

describe("the clock", () => {
  it("adds up while the programme is built and is saved by itself", async () => {
    show();
    expect(total()).toBe("08:00");
    fireEvent.change(screen.getByLabelText("Rounds"), { target: { value: "3" } });
    expect(total()).toBe("12:00");
    fireEvent.change(screen.getByLabelText("Seconds of rest, every line"), { target: { value: "0" } });
    expect(total()).toBe("06:00");
    await saved(1);
    expect(saves[0]).toMatchObject({ rounds: 3 });
    expect(saves[0]?.items.map((item) => item.restSeconds)).toEqual([0, 0, 0, 0]);
  });

  it("keeps a number that is out of range on the page, says so, and does not send it", async () => {
    show();
    fireEvent.change(screen.getByLabelText("Rounds"), { target: { value: "99" } });
    expect(screen.getByText("This programme: give rounds from 1 to 10.")).toBeTruthy();
    await new Promise((done) => setTimeout(done, 1300));
    expect(saves).toHaveLength(0);
    expect(screen.getByLabelText("Rounds")).toHaveProperty("value", "99");
    fireEvent.change(screen.getByLabelText("Rounds"), { target: { value: "4" } });
    await saved(1);
  });

  it("does not change when equipment is missing at home", async () => {
    show();
    press("Equipment at home");
    fireEvent.click(await screen.findByLabelText("firm chair"));
    press("Swap what is missing");
    expect(names()[0]).toContain("Squat");
    expect(screen.getByText(/not at home: swapped, same clock/)).toBeTruthy();
    expect(total()).toBe("08:00");
    await saved(1);
    expect(saves[0]?.items[0]).toMatchObject({ insteadOf: { exercise: "sit-to-stand", form: "no-hands" } });
  });
});

describe("the lines", () => {
  it("are added by search, each side on its own line", async () => {
    show();
    press(/Add an exercise/);
    const find = await screen.findByLabelText("Name, muscle or equipment");
    fireEvent.change(find, { target: { value: "backward leg" } });
    if (!(find instanceof HTMLInputElement) || !find.form) throw new Error("the search is a form");
    fireEvent.submit(find.form);
    expect(names()).toHaveLength(6);
    expect(names().slice(-2)).toEqual(["Backward leg reachleft", "Backward leg reachright"]);
    expect(total()).toBe("12:00");
  });

  it("move by Alt and an arrow, and leave with an undo", async () => {
    show();
    const first = document.querySelectorAll<HTMLElement>(".items .name")[0];
    if (!first) throw new Error("there is a first line");
    fireEvent.keyDown(first, { key: "ArrowDown", altKey: true });
    expect(names().slice(0, 2)).toEqual(["Step upleft", "Sit to stand"]);
    press(/^Bridge/);
    press(/^Remove\s*Bridge/);
    expect(names()).not.toContain("Bridge");
    fireEvent.click(await screen.findByRole("button", { name: /^Undo/ }));
    await waitFor(() => expect(names()).toContain("Bridge"));
  });

  it("climb the ladder until it ends, and say why", async () => {
    show();
    press("Easier form of Bridge");
    expect(screen.getByText("small lift, arms press down")).toBeTruthy();
    press("Easier form of Bridge");
    expect(screen.getByText(/Bridge is already in its easiest form/)).toBeTruthy();
  });

  it("take any support for the hands", async () => {
    show();
    press(/^Bridge/);
    const details = screen.getByLabelText("Details of 4. Bridge");
    fireEvent.change(within(details).getByLabelText("Support for the hands"), { target: { value: "rail" } });
    await saved(1);
    expect(saves[0]?.items[3]?.support).toBe("rail");
  });
});

describe("two people and the patient", () => {
  it("loses neither text when someone else saved in between", async () => {
    show();
    held = { ...held, version: 5, content: { ...held.content, rounds: 1 } };
    fireEvent.change(screen.getByLabelText("Rounds"), { target: { value: "3" } });
    await screen.findByText("Two people are changing this programme");
    expect(total()).toBe("12:00");
    press("Save mine over it");
    await saved(1);
    expect(saves[0]).toMatchObject({ rounds: 3 });
  });

  it("saves before it gives, and opens the paper", async () => {
    show();
    fireEvent.change(screen.getByLabelText("Rounds"), { target: { value: "3" } });
    press(/^Give to Ellie/);
    fireEvent.click(await screen.findByRole("button", { name: "Give and print" }));
    await waitFor(() => expect(window.open).toHaveBeenCalled());
    expect(saves).toHaveLength(1);
    expect(held.isIssued).toBe(true);
    expect(vi.mocked(window.open).mock.calls[0]?.[0]).toBe(
      "/api/clinical/programmes/p1/handout?versionNumber=1",
    );
  });

  it("shows an earlier version without anything to change it", () => {
    show({ ...hipSession, canWrite: false, isIssued: true });
    expect(screen.queryByRole("button", { name: /Add an exercise/ })).toBeNull();
    expect(screen.getByLabelText("Rounds")).toHaveProperty("disabled", true);
  });
});
