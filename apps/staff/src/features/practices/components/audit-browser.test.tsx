import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import type { AuditPage } from "@withy/contracts/audit";
import { afterEach, beforeEach, expect, it, vi } from "vitest";
import { AuditBrowser } from "./audit-browser";

const answer: AuditPage = {
  rows: [
    {
      id: "event-1",
      day: "2026-11-30",
      time: "09:12",
      actorName: "Bryony Catt",
      action: "appointment.booked",
      subjectKind: "appointment",
      subjectId: "visit-1",
      patientId: null,
      patientName: null,
      siteName: "Saltgate",
      detail: {},
    },
  ],
  page: 1,
  pageSize: 50,
  total: 1,
  isCutShort: false,
};

let asked: URLSearchParams[] = [];
beforeEach(() => {
  asked = [];
  vi.stubGlobal("fetch", async (path: string) => {
    asked.push(new URL(path, "http://withy.example").searchParams);
    return Response.json(answer);
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

async function show() {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  render(
    <QueryClientProvider client={client}>
      <AuditBrowser staff={[]} patientId={null} today="2026-12-01" />
    </QueryClientProvider>,
  );
  await screen.findByText("appointment booked");
}
const type = (label: string, value: string) =>
  fireEvent.change(screen.getByLabelText(label), { target: { value } });
const leave = (label: string) => fireEvent.blur(screen.getByLabelText(label));

it("takes a day as it is said, and says what it understood", async () => {
  await show();
  type("From", "yesterday");
  type("Until", "1 12 2026");
  expect(screen.getByText("Monday 30 November 2026")).toBeTruthy();
  expect(screen.getByText("Tuesday 1 December 2026")).toBeTruthy();
  await vi.waitFor(() => expect(asked).toHaveLength(3));
  expect(Object.fromEntries(asked[2] ?? [])).toMatchObject({ from: "2026-11-30", until: "2026-12-01" });
});

it("tells at the field what is not a date, keeps it as typed and leaves the list as it was", async () => {
  await show();
  type("From", "the day before");
  leave("From");
  const field = screen.getByLabelText<HTMLInputElement>("From");
  expect(field.value).toBe("the day before");
  expect(field.getAttribute("aria-invalid")).toBe("true");
  expect(screen.getByText("Enter a day such as 6 May, 6 5 2026 or yesterday")).toBeTruthy();
  expect(screen.getByText("appointment booked")).toBeTruthy();
  expect(asked).toHaveLength(1);
  type("From", "30 11 2026");
  expect(field.getAttribute("aria-invalid")).toBe(null);
  await vi.waitFor(() => expect(asked).toHaveLength(2));
});

it("asks for nothing while the last day is before the first", async () => {
  await show();
  type("From", "today");
  await vi.waitFor(() => expect(asked).toHaveLength(2));
  type("Until", "yesterday");
  leave("Until");
  expect(screen.getByText("Enter a day that is not before the first one")).toBeTruthy();
  expect(asked).toHaveLength(2);
});
