import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { cleanup, render } from "@testing-library/react";
import type { EpisodeView } from "@withy/contracts/clinical";
import { renderToString } from "react-dom/server";
import { afterEach, describe, expect, it } from "vitest";
import { GoalsForm } from "@/features/clinical/components/goals-form";

const episode = { id: "e1", version: 1, goals: [] } as unknown as EpisodeView;

const form = (
  <QueryClientProvider client={new QueryClient()}>
    <GoalsForm episode={episode} canWrite />
  </QueryClientProvider>
);

afterEach(cleanup);

describe("a form that only scripts can answer", () => {
  it("cannot be sent as it comes from the server, and can once scripts run", async () => {
    const page = document.createElement("div");
    document.body.append(page);
    page.innerHTML = renderToString(form);
    const button = () => page.querySelector<HTMLButtonElement>("button[type=submit]");
    expect(button()?.disabled).toBe(true);
    render(form, { container: page, hydrate: true });
    expect(button()?.disabled).toBe(false);
  });
});
