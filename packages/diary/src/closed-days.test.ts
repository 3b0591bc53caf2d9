import { describe, expect, it } from "vitest";
import { closedDays } from "./closed-days";

describe("days on which a site is shut", () => {
  it.each<["england" | "scotland", string, string | null]>([
    ["scotland", "2026-06-15", "World Cup bank holiday"],
    ["england", "2026-06-15", null],
    ["scotland", "2026-04-06", null],
    ["england", "2026-12-26", null],
    ["england", "2027-12-26", null],
  ])("%s on %s", (nation, day, name) => {
    expect(closedDays(nation, [], "2026-01-01", "2027-12-31").get(day) ?? null).toBe(name);
  });

  it("gives the site's own reason where both say shut, and none outside the days asked for", () => {
    const closures = [
      { on: "2026-12-25", reason: "Boiler repair" },
      { on: "2026-12-29", reason: "Training" },
    ];
    expect([...closedDays("england", closures, "2026-12-25", "2026-12-28").values()]).toEqual([
      "Boiler repair",
      expect.any(String),
    ]);
  });
});
