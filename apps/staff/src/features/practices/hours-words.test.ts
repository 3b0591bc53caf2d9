import { expect, test } from "vitest";
import { hoursWords } from "./hours-words";
import { heldWords } from "./role-words";

const on = (weekday: number, opensAt: string, closesAt: string) => ({ weekday, opensAt, closesAt });

test("days in a row with the same hours are told once", () => {
  const week = [1, 2, 3, 4, 5].map((weekday) => on(weekday, "08:00", "18:00"));
  expect(hoursWords([on(6, "09:00", "13:00"), ...week])).toBe(
    "Mon to Fri 08:00 to 18:00, Sat 09:00 to 13:00",
  );
  expect(hoursWords([on(1, "08:00", "18:00"), on(3, "08:00", "18:00")])).toBe(
    "Mon 08:00 to 18:00, Wed 08:00 to 18:00",
  );
  expect(hoursWords([])).toBe("");
});

test("roles are told by role, with their sites in the practice's order", () => {
  const sites = [
    { id: "s", name: "Saltgate" },
    { id: "t", name: "Tollhouse Lane" },
  ];
  expect(heldWords([], sites)).toBe("none");
  expect(
    heldWords(
      [
        { role: "owner", siteId: null },
        { role: "therapist", siteId: "t" },
        { role: "therapist", siteId: "s" },
      ],
      sites,
    ),
  ).toBe("Owner everywhere, Therapist at Saltgate and Tollhouse Lane");
});
