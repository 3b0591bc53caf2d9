import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import type { DraftingJobView, VisitToInvoiceView } from "@withy/contracts/billing";
import { ChangesProvider } from "@withy/ui/recent-changes";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { VisitsToInvoice } from "./visits-to-invoice";

const visit = (n: number): VisitToInvoiceView => ({
  appointmentId: `visit-${n}`,
  patientId: `patient-${n}`,
  patientName: `Perran Oake ${n}`,
  payerName: null,
  siteName: "Saltgate",
  serviceName: "Follow-up",
  on: "2026-11-24",
  pricePence: 5200,
});
const visits = (count: number) => Array.from({ length: count }, (_, n) => visit(n));
const job: DraftingJobView = {
  id: "job-1",
  state: "waiting",
  progressDone: 0,
  progressTotal: 0,
  result: null,
  problem: null,
};
const half = { drafts: 200, visitsDrafted: 240, visitsWithoutPrice: 0 };

let calls: string[] = [];
let stands: DraftingJobView;
beforeEach(() => {
  calls = [];
  stands = job;
  vi.stubGlobal("fetch", async (path: string, init: RequestInit = {}) => {
    calls.push(`${init.method ?? "GET"} ${path}`);
    const body = path.endsWith("/drafts")
      ? { invoiceIds: ["a", "b"], visitsDrafted: 3, visitsWithoutPrice: 0 }
      : stands;
    return Response.json(body);
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function show(count: number, more: { areMore?: boolean; drafting?: DraftingJobView } = {}) {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  render(
    <QueryClientProvider client={client}>
      <ChangesProvider>
        <VisitsToInvoice
          visits={visits(count)}
          totalPence={count * 5200}
          areMore={more.areMore ?? false}
          drafting={more.drafting ?? null}
          today="2026-12-01"
          mayDraft
        />
      </ChangesProvider>
    </QueryClientProvider>,
  );
}
const press = () => fireEvent.click(screen.getByRole("button", { name: /^Draft \d+ visit/ }));
const isBusy = () => screen.getByRole("button", { name: /^Draft \d+ visit/ }).getAttribute("aria-busy");

describe("drafting what was attended", () => {
  it("answers at once for a few visits, and says what was done", async () => {
    show(3);
    press();
    await screen.findByText("3 visits put on 2 drafts");
    expect(calls).toEqual(["POST /api/billing/drafts"]);
  });

  it("follows the worker for many, and says the end once", async () => {
    show(629);
    press();
    await screen.findByText("Drafting begins");
    stands = { ...job, state: "running", progressDone: 240, progressTotal: 629, result: half };
    await screen.findByText("Drafting: 240 of 629 visits", {}, { timeout: 3_000 });
    expect(isBusy()).toBe("true");
    press();
    const result = { drafts: 502, visitsDrafted: 629, visitsWithoutPrice: 0 };
    stands = { ...job, state: "done", progressDone: 629, progressTotal: 629, result };
    expect(await screen.findAllByText("629 visits put on 502 drafts", {}, { timeout: 3_000 })).toHaveLength(
      1,
    );
    expect(screen.queryByText(/^Drafting/)).toBeNull();
    expect(isBusy()).toBeNull();
    expect(calls.filter((call) => call.startsWith("POST"))).toEqual(["POST /api/billing/drafting"]);
    expect(calls.at(-1)).toBe("GET /api/billing/drafting/job-1");
  });

  it("leaves to the worker what is more than the list shows", async () => {
    show(4, { areMore: true });
    press();
    await screen.findByText("Drafting begins");
    expect(calls[0]).toBe("POST /api/billing/drafting");
  });

  it("goes on showing what was under way when the page is opened again, and says why it failed", async () => {
    stands = { ...job, state: "running", progressDone: 240, progressTotal: 629, result: half };
    show(389, { drafting: stands });
    screen.getByText("Drafting: 240 of 629 visits");
    stands = { ...stands, state: "failed", problem: "Something went wrong on our side." };
    await screen.findByText("Something went wrong on our side.", {}, { timeout: 3_000 });
    expect(isBusy()).toBeNull();
  });
});
