import { appointmentStates, stateFacts } from "@withy/diary/appointment-states";
import { bankHolidays, type Nation } from "@withy/diary/bank-holidays";
import { describe, expect, it } from "vitest";

const days = (nation: Nation, year: number): string =>
  bankHolidays(nation, year)
    .map((h) => h.on.slice(5))
    .join(" ");

// The published lists of bank holidays; Christmas substitutes as confirmed in the press for 2026 and 2027, and
// Scotland's 15 June 2026 by Royal Proclamation (Scottish Government, 5 February 2026).
const england = {
  2026: "01-01 04-03 04-06 05-04 05-25 08-31 12-25 12-28",
  2027: "01-01 03-26 03-29 05-03 05-31 08-30 12-27 12-28",
};
const scotland = {
  2026: "01-01 01-02 04-03 05-04 05-25 06-15 08-03 11-30 12-25 12-28",
  2027: "01-01 01-04 03-26 05-03 05-31 08-02 11-30 12-27 12-28",
};

describe("bank holidays as published", () => {
  it.each<[Nation, number, string]>([
    ["england", 2026, england[2026]],
    ["england", 2027, england[2027]],
    ["wales", 2026, england[2026]],
    ["wales", 2027, england[2027]],
    ["scotland", 2026, scotland[2026]],
    ["scotland", 2027, scotland[2027]],
  ])("%s %i", (nation, year, expected) => expect(days(nation, year)).toBe(expected));

  it("Easter Monday is not a bank holiday in Scotland", () => {
    expect(days("scotland", 2026)).not.toContain("04-06");
    expect(days("scotland", 2027)).not.toContain("03-29");
  });
});

describe("codes of appointments", () => {
  // HL7 FHIR R4 (4.0.1), code system AppointmentStatus.
  const r4 =
    "proposed pending booked arrived fulfilled cancelled noshow entered-in-error checked-in waitlist".split(
      " ",
    );

  it("every state maps to a code of FHIR R4, and the codes that R4 has keep their own names", () => {
    for (const state of appointmentStates) {
      expect(r4).toContain(stateFacts[state].fhir);
      if (r4.includes(state)) expect(stateFacts[state].fhir).toBe(state);
    }
    expect(stateFacts.confirmed.fhir).toBe("booked");
    expect(stateFacts["in-session"].fhir).toBe("arrived");
  });
});
