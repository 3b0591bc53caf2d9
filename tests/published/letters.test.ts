import { letterHeadings, letterSectionKeys } from "@withy/contracts/letters";
import { appointmentCalendar } from "@withy/documents/calendar/appointment-calendar";
import { assembleDischargeLetter } from "@withy/documents/letter/assemble-discharge-letter";
import { hipFacts } from "@withy/documents/letter/scenario.test-data";
import { readFailure } from "@withy/gateways/mail";
import ICAL from "ical.js";
import { describe, expect, it } from "vitest";

/**
 * Headings of the outpatient letter: Professional Record Standards Body, outpatient letter v2.2 (April 2023), with
 * the Academy of Medical Royal Colleges' headings. The list is from memory.
 */
const publishedHeadings = [
  "Patient demographics",
  "GP practice",
  "Referrer details",
  "Attendance details",
  "Diagnoses",
  "Procedures",
  "Clinical summary",
  "Relevant history",
  "Medications and devices",
  "Allergies and adverse reactions",
  "Safety alerts",
  "Social context",
  "Individual requirements",
  "Examination findings",
  "Assessment scales",
  "Investigation results",
  "Patient and carer concerns, expectations and wishes",
  "Plan and requested actions",
  "Information and advice given",
  "Person completing record",
  "Distribution list",
];

describe("the outpatient letter standard", () => {
  it("has every heading that our letters use", () => {
    expect(
      letterSectionKeys
        .map((key) => letterHeadings[key])
        .filter((heading) => !publishedHeadings.includes(heading)),
    ).toEqual([]);
  });

  it("asks for the plan near the top, with the doctor's and the patient's actions named apart (RCR ten tips; from memory)", () => {
    const letter = assembleDischargeLetter(hipFacts);
    const place = letter.findIndex((section) => section.heading === "Plan and requested actions");
    expect(place).toBeLessThanOrEqual(1);
    const actors = letter[place]?.sentences.map((sentence) => sentence.actor) ?? [];
    expect(actors).toEqual(expect.arrayContaining(["gp", "patient"]));
    expect(actors).not.toContain(null);
  });

  it("tells 'none known' from 'not asked': silence about allergies never reads as none (check values, section 6)", () => {
    const allergies = assembleDischargeLetter({ ...hipFacts, history: [] }).find(
      (section) => section.heading === "Allergies and adverse reactions",
    );
    expect(allergies?.sentences.map((sentence) => sentence.text)).toEqual([
      "Not recorded separately by this service.",
    ]);
  });
});

describe("reply codes of a mail server (RFC 5321, 4.2.1: 4yz transient, 5yz permanent)", () => {
  it.each([
    [421, "try-later"],
    [450, "try-later"],
    [451, "try-later"],
    [452, "try-later"],
    [550, "refused"],
    [551, "refused"],
    [552, "refused"],
    [553, "refused"],
    [554, "refused"],
  ] as const)("%i is %s", (responseCode, outcome) => {
    expect(readFailure({ command: "RCPT TO", responseCode }).outcome).toBe(outcome);
  });
});

describe("a weekly visit at nine in the morning, Europe/London (check values, section 8.2)", () => {
  it.each([
    ["2026-10-20", "2026-10-20T08:00:00Z"],
    ["2026-10-27", "2026-10-27T09:00:00Z"],
    ["2027-03-23", "2027-03-23T09:00:00Z"],
    ["2027-03-30", "2027-03-30T08:00:00Z"],
  ])("on %s stands in the calendar file at %s", (_, instant) => {
    const file = appointmentCalendar(
      {
        id: "01890000-0000-7000-8000-000000000001",
        version: 1,
        startsAt: new Date(instant),
        endsAt: new Date(new Date(instant).getTime() + 30 * 60_000),
        practice: "Marram Physiotherapy",
        practiceEmail: "office@marram.example",
        place: "Saltgate, Easterhaven",
        withWhom: "With Nia Prosser, physiotherapist",
        phone: "01632 960110",
        attendee: { name: "Eleri Tamworth", email: "eleri@post.example" },
        at: new Date("2026-10-01T09:00:00Z"),
      },
      false,
    );
    const event = new ICAL.Component(ICAL.parse(file.content) as unknown[]).getFirstSubcomponent("vevent");
    expect(event?.getFirstPropertyValue("dtstart")?.toString()).toBe(instant);
  });
});
