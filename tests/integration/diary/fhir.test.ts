import { newId } from "@withy/core/ids";
import {
  capabilityStatement,
  type KeyContext,
  operationOutcome,
  readFhir,
  searchFhir,
} from "@withy/services/diary/fhir/index";
import type { Appointment, Bundle, Schedule, Slot } from "fhir/r4";
import { beforeAll, describe, expect, it } from "vitest";
import { systemContextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { fhirFaults } from "../../support/fhir-schema";
import { addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";

const base = "https://withy.example/api/fhir/r4";
let practice: TestPractice;
let other: TestPractice;
const visits: Awaited<ReturnType<typeof addAppointment>>[] = [];

const keyOf = (of: TestPractice): KeyContext => ({
  ...systemContextFor(of),
  practiceId: of.practiceId,
  zone: of.zone,
});

beforeAll(async () => {
  practice = await buildPractice();
  other = await buildPractice({ name: "Cairn & Firth Clinics" });
  const patient = await addPatient(practice, { givenName: "Perran", familyName: "Oake" });
  const { otherTherapist } = practice.staff;
  const tollhouse = {
    therapistId: otherTherapist.id,
    siteId: practice.sites.tollhouse.id,
    roomId: practice.rooms.tollhouseRoom1.id,
  };
  const plan = [
    ["2026-12-01", "15:00", { state: "confirmed" as const }],
    ["2026-12-02", "09:00", { state: "arrived" as const, deskNote: "Brings a chair" }],
    ["2026-12-02", "10:00", { state: "cancelled" as const, cancelledBy: "patient" as const, version: 2 }],
    ["2026-12-02", "10:00", {}],
    ["2026-12-02", "10:00", tollhouse],
    ["2026-12-03", "00:00", {}],
    ["2026-12-08", "10:00", { state: "in-session" as const }],
  ] as const;
  for (const [day, time, values] of plan)
    visits.push(await addAppointment(practice, { patientId: patient.id, day, time, values }));
  await addAppointment(other, { patientId: (await addPatient(other)).id, day: "2026-12-02", time: "09:00" });
});

interface Found<T> {
  bundle: Bundle;
  resources: T[];
}

async function search<T = Appointment>(type: string, query: string, of = practice): Promise<Found<T>> {
  const bundle = (await searchFhir(keyOf(of), base, type, new URLSearchParams(query))) as Bundle;
  expect(fhirFaults(bundle)).toEqual([]);
  const resources = (bundle.entry ?? []).map((entry) => entry.resource as T);
  for (const resource of resources) expect(fhirFaults(resource)).toEqual([]);
  return { bundle, resources };
}

const startsOf = (resources: Appointment[]) => resources.map((one) => one.start?.slice(5, 16));

describe("appointments", () => {
  it("tell state, time and people, the patient by initials alone, and are sound R4", async () => {
    const { resources } = await search("Appointment", "");
    expect(resources.map((one) => one.status)).toEqual([
      ...["booked", "arrived", "cancelled", "booked", "booked", "booked", "arrived"],
    ]);
    const [first] = resources;
    expect(first).toMatchObject({ start: "2026-12-01T15:00:00.000Z", minutesDuration: 30 });
    expect(first?.participant.map((one) => one.actor?.display)).toEqual([
      "P. O.",
      `${practice.staff.therapist.givenName} ${practice.staff.therapist.familyName}`,
      practice.sites.saltgate.name,
    ]);
    const cancelled = resources.find((one) => one.status === "cancelled");
    expect(cancelled?.cancelationReason?.coding?.[0]?.code).toBe("pat");
    const told = JSON.stringify(resources);
    for (const word of ["Oake", "Follow-up", "chair", "post.example"]) expect(told).not.toContain(word);
  });

  it.each<[string, string, string[]]>([
    [
      "a day, from midnight to midnight at the site",
      "date=2026-12-02",
      ["12-02T09:00", "12-02T10:00", "12-02T10:00", "12-02T10:00"],
    ],
    ["from a day on", "date=ge2026-12-03", ["12-03T00:00", "12-08T10:00"]],
    ["after a day", "date=gt2026-12-02", ["12-03T00:00", "12-08T10:00"]],
    ["before a day", "date=lt2026-12-02", ["12-01T15:00"]],
    ["up to and with a day", "date=le2026-12-01", ["12-01T15:00"]],
    ["between two instants", "date=ge2026-12-02T09:00:00Z&date=lt2026-12-02T10:00:00Z", ["12-02T09:00"]],
    [
      "after an instant, in another zone, with an escaped plus",
      "date=gt2026-12-02T11:00:00%2B01:00&date=le2026-12-03",
      ["12-03T00:00"],
    ],
    ["and with a plus as it is typed", "date=eq2026-12-02T10:00:00+01:00", ["12-02T09:00"]],
    ["a state and what lies under it", "status=arrived", ["12-02T09:00", "12-08T10:00"]],
    ["two states", "status=cancelled,arrived&date=2026-12-02", ["12-02T09:00", "12-02T10:00"]],
    ["a state that this diary never has", "status=waitlist", []],
    ["nothing at all", "date=2027-12-02", []],
  ])("are found by %s", async (_, query, starts) => {
    expect(startsOf((await search("Appointment", query)).resources)).toEqual(starts);
  });

  it("are found by therapist and by site", async () => {
    const { otherTherapist, therapist } = practice.staff;
    const by = async (query: string) => (await search("Appointment", query)).resources.length;
    expect(await by(`practitioner=Practitioner/${otherTherapist.id}`)).toBe(1);
    expect(await by(`practitioner=${otherTherapist.id},${therapist.id}`)).toBe(7);
    expect(await by(`location=Location/${practice.sites.tollhouse.id}`)).toBe(1);
    const both = `practitioner=${therapist.id}&location=${practice.sites.tollhouse.id}`;
    expect(await by(both)).toBe(0);
    expect(await by(`practitioner=${newId()}`)).toBe(0);
    expect(await by(`practitioner=${other.staff.therapist.id}`)).toBe(0);
    expect(await by(`location=${other.sites.saltgate.id}`)).toBe(0);
  });

  it("come page by page, each once and in order, by the links alone", async () => {
    const all = (await search("Appointment", "")).resources.map((one) => one.id);
    for (const count of [1, 2, 3, 7]) {
      const seen: (string | undefined)[] = [];
      let query: string | null = `_count=${count}&date=ge2026-12-01`;
      while (query !== null) {
        const { bundle, resources }: Found<Appointment> = await search("Appointment", query);
        expect(resources.length).toBeLessThanOrEqual(count);
        seen.push(...resources.map((one) => one.id));
        const next: string | undefined = bundle.link?.find((link) => link.relation === "next")?.url;
        expect(next?.startsWith(`${base}/Appointment?`) ?? true).toBe(true);
        query = next === undefined ? null : new URL(next).search.slice(1);
      }
      expect(seen).toEqual(all);
    }
  });
});

describe("schedules and slots", () => {
  it("stand for a therapist at a site, and read back by their id", async () => {
    const { resources } = await search<Schedule>("Schedule", "");
    expect(resources.length).toBe(3);
    for (const one of resources) {
      const read = await readFhir(keyOf(practice), "Schedule", one.id ?? "");
      expect(read).toEqual(one);
      await expect(readFhir(keyOf(other), "Schedule", one.id ?? "")).rejects.toMatchObject({
        code: "not-found",
      });
    }
    const mine = await search<Schedule>("Schedule", `practitioner=${practice.staff.therapist.id}`);
    expect(mine.resources.map((one) => one.actor[1]?.reference)).toEqual([
      `Location/${practice.sites.saltgate.id}`,
    ]);
    expect((await search("Schedule", "_count=2")).bundle.link?.map((link) => link.relation)).toEqual([
      "self",
      "next",
    ]);
  });

  it("cover the working day with free, taken and away, and never say who takes it", async () => {
    const who = `practitioner=${practice.staff.therapist.id}`;
    const { resources } = await search<Slot>("Slot", `${who}&date=2026-12-02`);
    const told = resources.map((one) => [one.status, one.start.slice(11, 16), one.end.slice(11, 16)]);
    expect(told.slice(0, 4)).toEqual([
      ["free", "08:00", "09:00"],
      ["busy", "09:00", "09:35"],
      ["free", "09:35", "10:00"],
      ["busy", "10:00", "10:35"],
    ]);
    expect(told.at(-1)?.[2]).toBe("16:00");
    const busy = await search<Slot>("Slot", `${who}&start=2026-12-02&status=busy`);
    expect(busy.resources.length).toBe(2);
    for (const one of resources) {
      expect(await readFhir(keyOf(practice), "Slot", one.id ?? "")).toEqual(one);
      await expect(readFhir(keyOf(other), "Slot", one.id ?? "")).rejects.toMatchObject({ code: "not-found" });
    }
    expect(JSON.stringify(resources)).not.toMatch(/Patient|Oake/);
  });

  it("tell a week from today where no day is named, page by page", async () => {
    const schedule = (await search<Schedule>("Schedule", `practitioner=${practice.staff.therapist.id}`))
      .resources[0];
    const all = (await search<Slot>("Slot", `schedule=Schedule/${schedule?.id}&_count=200`)).resources;
    expect(new Set(all.map((one) => one.start.slice(0, 10))).size).toBe(5);
    const seen: (string | undefined)[] = [];
    let query: string | null = `schedule=${schedule?.id}&_count=4`;
    while (query !== null) {
      const { bundle, resources }: Found<Slot> = await search<Slot>("Slot", query);
      seen.push(...resources.map((one) => one.id));
      const next: string | undefined = bundle.link?.find((link) => link.relation === "next")?.url;
      query = next === undefined ? null : new URL(next).search.slice(1);
    }
    expect(seen).toEqual(all.map((one) => one.id));
  });
});

describe("what cannot be asked", () => {
  it.each([
    ["Appointment", "date=tomorrow", "invalid"],
    ["Appointment", "date=2026-02-30", "invalid"],
    ["Appointment", "date=2026-12-01T09:00:00", "invalid"],
    ["Appointment", "date=ne2026-12-01", "not-supported"],
    ["Appointment", "practitioner=Patient/1", "invalid"],
    ["Appointment", "location=Saltgate", "invalid"],
    ["Appointment", "status=attended", "invalid"],
    ["Appointment", "_count=0", "invalid"],
    ["Appointment", "_count=many", "invalid"],
    ["Appointment", "_after=nonsense", "invalid"],
    ["Appointment", "patient=Patient/1", "not-supported"],
    ["Appointment", "status=booked&status=arrived", "invalid"],
    ["Appointment", "_format=xml", "not-supported"],
    ["Schedule", "status=active", "not-supported"],
    ["Schedule", "_after=x", "invalid"],
    ["Slot", "date=2026-12-02", "too-costly"],
    ["Slot", "status=booked", "invalid"],
    ["Patient", "", "not-supported"],
  ])("%s?%s is %s and says what to send", async (type, query, kind) => {
    const asked = searchFhir(keyOf(practice), base, type, new URLSearchParams(query));
    await expect(asked).rejects.toMatchObject({ kind });
    await expect(asked).rejects.toThrow(/\.$/);
  });

  it("more than a month of slots is too much at once", async () => {
    const query = `practitioner=${practice.staff.therapist.id}&date=ge2026-12-01&date=lt2027-01-15`;
    await expect(searchFhir(keyOf(practice), base, "Slot", new URLSearchParams(query))).rejects.toMatchObject(
      { kind: "too-costly" },
    );
  });

  it("another practice's visit, a missing one and an id that is none answer the same", async () => {
    const id = visits[0]?.id ?? "";
    expect(fhirFaults(await readFhir(keyOf(practice), "Appointment", id))).toEqual([]);
    const words = (of: TestPractice, asked: string) =>
      readFhir(keyOf(of), "Appointment", asked).catch((error: Error) => error.message);
    const foreign = await words(other, id);
    expect(foreign).toBe("There is no Appointment with this id.");
    expect(await words(practice, newId())).toBe(foreign);
    expect(await words(practice, "1' or '1'='1")).toBe(foreign);
  });
});

it("the statement of what it can do and its refusals are sound R4 too", () => {
  expect(fhirFaults(capabilityStatement(base, practice.clock.now()))).toEqual([]);
  for (const code of ["invalid", "login", "not-found", "not-supported", "throttled", "too-costly"] as const)
    expect(fhirFaults(operationOutcome(code, "What to do."))).toEqual([]);
});
