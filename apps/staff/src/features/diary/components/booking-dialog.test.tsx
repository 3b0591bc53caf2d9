import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import type { BookingChoicesView } from "@withy/contracts/diary";
import { ChangesProvider } from "@withy/ui/recent-changes";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { ShortcutProvider } from "@/components/shortcuts/shortcut-provider";
import { wantedTime } from "../wanted-time";
import { BookingDialog } from "./booking-dialog";

vi.mock("next/navigation", () => ({ useRouter: () => ({ push: vi.fn() }) }));

const choices: BookingChoicesView = {
  weights: { wish: 40, wait: 15, knows: 30, day: 15 },
  sites: [{ id: "saltgate", name: "Saltgate", zone: "Europe/London", today: "2026-12-01" }],
  services: [
    {
      id: "initial",
      name: "Initial assessment",
      kind: "initial",
      durationMinutes: 45,
      cleanDownMinutes: 0,
      roomKind: "treatment",
      therapistIds: ["nia"],
    },
  ],
  therapists: [{ id: "nia", name: "Nia Prosser", siteIds: ["saltgate"] }],
  rooms: [{ id: "reed", name: "Reed", siteId: "saltgate", kind: "treatment" }],
};

const sent: { url: string; body: unknown; key: string | null }[] = [];
let answer: () => Response;

beforeEach(() => {
  sent.length = 0;
  vi.stubGlobal("fetch", async (url: string, init: RequestInit) => {
    // That the time is held while the form is open is a courtesy on the side.
    if (url === "/api/diary/hold") return Response.json({});
    const key = new Headers(init.headers).get("idempotency-key");
    sent.push({ url, body: JSON.parse(String(init.body)), key });
    return answer();
  });
});

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function open(patient: { id: string; label: string } | null) {
  const start = {
    wanted: wantedTime({ day: "2026-12-02", time: "10:15", siteId: "saltgate", therapistId: "nia" }),
    patient,
    serviceId: patient ? "initial" : "",
  };
  render(
    <QueryClientProvider client={new QueryClient()}>
      <ChangesProvider>
        <ShortcutProvider>
          <BookingDialog
            start={start}
            choices={choices}
            today="2026-12-01"
            onClose={() => {}}
            onBooked={() => {}}
          />
        </ShortcutProvider>
      </ChangesProvider>
    </QueryClientProvider>,
  );
}

const submit = () => fireEvent.click(screen.getByRole("button", { name: "Book Wed 2 Dec, 10:15" }));

test("what is missing is named in the words of its field, and nothing is sent", () => {
  open(null);
  submit();
  expect(screen.getByRole("link", { name: "Choose a patient" }).getAttribute("href")).toBe("#book-patientId");
  expect(screen.getByRole("link", { name: "Choose what the visit is for" })).toBeTruthy();
  expect(sent).toEqual([]);
});

test("a time that was taken meanwhile keeps the form and offers the next three", async () => {
  const free = (startTime: string, day = "2026-12-02") => ({
    startsAt: `${day}T${startTime}:00.000Z`,
    day,
    startTime,
    roomId: "reed",
  });
  answer = () =>
    Response.json(
      {
        type: "/problems/slot-taken",
        title: "slot-taken",
        status: 409,
        detail: "Nia Prosser was booked at that time a moment ago. Choose another time.",
        code: "refused",
        kind: "slot-taken",
        fields: [
          {
            field: "startsAt",
            message: "Nia Prosser was booked at that time a moment ago. Choose another time.",
          },
        ],
        requestId: "r",
        more: {
          takenBy: null,
          nextFree: [free("11:00"), free("11:45"), free("09:00", "2026-12-03"), free("10:00", "2026-12-03")],
        },
      },
      { status: 409 },
    );
  open({ id: "joan", label: "Joan Larkin" });
  fireEvent.change(screen.getByLabelText("Desk note"), { target: { value: "rings back at 11" } });
  submit();
  await screen.findByRole("heading", { name: "The next free times with the same therapist" });
  expect(sent[0]).toMatchObject({
    url: "/api/diary/appointments",
    body: {
      patientId: "joan",
      serviceId: "initial",
      therapistId: "nia",
      startsAt: "2026-12-02T10:15",
      roomId: null,
    },
  });
  expect(screen.getByLabelText<HTMLInputElement>("Desk note").value).toBe("rings back at 11");
  expect(screen.getByLabelText<HTMLInputElement>("Patient").value).toBe("Joan Larkin");
  const offers = screen
    .getAllByRole("button", { name: /Dec, \d\d:\d\d$/ })
    .filter((b) => !b.textContent?.startsWith("Book"));
  expect(offers.map((offer) => offer.textContent)).toEqual([
    "Wed 2 Dec, 11:00",
    "Wed 2 Dec, 11:45",
    "Thu 3 Dec, 09:00",
  ]);

  fireEvent.click(screen.getByRole("button", { name: "Thu 3 Dec, 09:00" }));
  fireEvent.click(screen.getByRole("button", { name: "Book Thu 3 Dec, 09:00" }));
  await vi.waitFor(() => expect(sent).toHaveLength(2));
  expect(sent[1]?.body).toMatchObject({
    startsAt: "2026-12-03T09:00",
    roomId: "reed",
    deskNote: "rings back at 11",
  });
  expect(sent[1]?.key).not.toBe(sent[0]?.key);
});
