import { newId } from "@withy/core/ids";
import { appointments } from "@withy/db/schema";
import {
  dischargeEpisode,
  getEpisode,
  listEpisodes,
  openEpisode,
  recordRedFlags,
  reopenEpisode,
  saveGoals,
  signNote,
  startNote,
} from "@withy/services/clinical";
import { and, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { contextFor } from "../../support/contexts";
import { addAppointment } from "../../support/diary-rows";
import { addEpisode, addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";
import { addNote, addVisit } from "./visit-with-note";

let practice: TestPractice;
let foreign: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
  foreign = await buildPractice({ name: "Cairn & Firth Clinics" });
});

const therapist = () => contextFor(practice, "therapist");
const hip = () => ({
  siteId: practice.sites.saltgate.id,
  problem: "Hip osteoarthritis",
  region: "hip",
  side: "left" as const,
});

describe("opening an episode", () => {
  it("stands under whoever opens it, ties the visit to it and is audited", async () => {
    const patient = await addPatient(practice);
    const visit = await addAppointment(practice, {
      patientId: patient.id,
      day: "2026-12-01",
      time: "10:00",
      values: { state: "arrived" },
    });
    const episode = await openEpisode(therapist(), {
      ...hip(),
      patientId: patient.id,
      appointmentId: visit.id,
      goals: ["Walk to the harbour and back"],
      plannedVisits: 6,
    });
    expect(episode).toMatchObject({
      place: "Left hip",
      state: "open",
      openedOn: "2026-12-01",
      therapistName: "Ana Ferreby",
      notes: 0,
    });
    expect(episode.goals).toEqual([
      { text: "Walk to the harbour and back", setOn: "2026-12-01", metOn: null },
    ]);
    const [row] = await practice.db
      .select()
      .from(appointments)
      .where(and(eq(appointments.practiceId, practice.practiceId), eq(appointments.id, visit.id)));
    expect(row?.episodeId).toBe(episode.id);
    const audit = await auditOf(practice, episode.id);
    expect(audit.map((a) => [a.action, a.patientId])).toEqual([["episode.opened", patient.id]]);
  });

  it("acts once for one key", async () => {
    const patient = await addPatient(practice);
    const ctx = contextFor(practice, "therapist", { idempotencyKey: newId() });
    const first = await openEpisode(ctx, { ...hip(), patientId: patient.id });
    expect((await openEpisode(ctx, { ...hip(), patientId: patient.id })).id).toBe(first.id);
    expect(await listEpisodes(therapist(), { patientId: patient.id })).toHaveLength(1);
  });

  it("refuses a limb without a side, an unknown region and empty words", async () => {
    const patient = await addPatient(practice);
    await expect(
      openEpisode(therapist(), { ...hip(), side: "none", patientId: patient.id }),
    ).rejects.toMatchObject({ kind: "side-and-region" });
    await expect(
      openEpisode(therapist(), { ...hip(), region: "tail", problem: " ", patientId: patient.id }),
    ).rejects.toMatchObject({
      code: "invalid",
      fields: [{ field: "problem" }, { field: "region" }],
    });
  });

  it("another practice's patient and site are not found", async () => {
    const stranger = await addPatient(foreign);
    await expect(openEpisode(therapist(), { ...hip(), patientId: stranger.id })).rejects.toMatchObject({
      code: "not-found",
    });
    const patient = await addPatient(practice);
    await expect(
      openEpisode(therapist(), { ...hip(), siteId: foreign.sites.saltgate.id, patientId: patient.id }),
    ).rejects.toMatchObject({ code: "not-found" });
    const other = await addPatient(practice);
    const visit = await addAppointment(practice, { patientId: other.id, day: "2026-12-01", time: "11:00" });
    await expect(
      openEpisode(therapist(), { ...hip(), patientId: patient.id, appointmentId: visit.id }),
    ).rejects.toMatchObject({ kind: "other-patient" });
  });
});

describe("reading episodes", () => {
  it("records who looked", async () => {
    const patient = await addPatient(practice);
    const { id } = await addEpisode(practice, patient.id);
    await getEpisode(contextFor(practice, "owningTherapist"), { episodeId: id });
    await listEpisodes(therapist(), { patientId: patient.id });
    expect((await auditOf(practice, id)).map((a) => [a.action, a.actorId])).toEqual([
      ["episode.read", practice.staff.owningTherapist.id],
    ]);
    expect((await auditOf(practice, patient.id)).map((a) => a.action)).toEqual(["episodes.listed"]);
  });

  it.each(["receptionist", "owner", "accounts"] as const)("%s is refused", async (person) => {
    const patient = await addPatient(practice);
    const { id } = await addEpisode(practice, patient.id);
    const ctx = contextFor(practice, person);
    await expect(getEpisode(ctx, { episodeId: id })).rejects.toMatchObject({ code: "forbidden" });
    await expect(listEpisodes(ctx, { patientId: patient.id })).rejects.toMatchObject({ code: "forbidden" });
    await expect(openEpisode(ctx, { ...hip(), patientId: patient.id })).rejects.toMatchObject({
      code: "forbidden",
    });
  });

  it("shows only the sites within reach", async () => {
    const patient = await addPatient(practice);
    await addEpisode(practice, patient.id);
    await addEpisode(practice, patient.id, { siteId: practice.sites.tollhouse.id, side: "right" });
    const roles = [{ role: "therapist" as const, siteId: practice.sites.tollhouse.id }];
    const list = await listEpisodes(contextFor(practice, "otherTherapist", { roles }), {
      patientId: patient.id,
    });
    expect(list.map((episode) => episode.place)).toEqual(["Right hip"]);
  });
});

describe("goals and red flags", () => {
  it("a goal that keeps its words keeps the day it was set", async () => {
    const patient = await addPatient(practice);
    const { id } = await addEpisode(practice, patient.id, {
      goals: [{ text: "Stairs", setOn: "2026-11-17", metOn: null }],
    });
    const saved = await saveGoals(therapist(), {
      episodeId: id,
      version: 1,
      goals: [
        { text: "Stairs", isMet: true },
        { text: "Garden", isMet: false },
      ],
    });
    expect(saved.goals).toEqual([
      { text: "Stairs", setOn: "2026-11-17", metOn: "2026-12-01" },
      { text: "Garden", setOn: "2026-12-01", metOn: null },
    ]);
    await expect(saveGoals(therapist(), { episodeId: id, version: 1, goals: [] })).rejects.toMatchObject({
      code: "stale",
    });
  });

  it("keeps the answers to the questions of the region, and counts in the audit without words", async () => {
    const patient = await addPatient(practice);
    const { id } = await addEpisode(practice, patient.id);
    const saved = await recordRedFlags(therapist(), {
      episodeId: id,
      version: 1,
      answers: { "night-pain": "present", trauma: "absent", "saddle-numbness": "present" },
    });
    expect(saved.redFlags).toMatchObject({
      "night-pain": "present",
      trauma: "absent",
      steroids: "not-asked",
    });
    expect(saved.redFlags).not.toHaveProperty("saddle-numbness");
    expect((await auditOf(practice, id)).at(-1)?.detail).toEqual({ asked: 2, present: 1 });
  });
});

describe("discharging", () => {
  it("waits for every signature, then ends; can be opened again; takes no note meanwhile", async () => {
    const { episode, noteId, version, patient } = await addNote(practice, { isWritten: true });
    const end = (seen: number) =>
      dischargeEpisode(therapist(), { episodeId: episode.id, version: seen, outcome: "goals-met" });
    await expect(end(1)).rejects.toMatchObject({ kind: "notes-unsigned" });
    await signNote(therapist(), { noteId, version });
    const ended = await end(1);
    expect(ended).toMatchObject({ state: "discharged", dischargedOn: "2026-12-01", outcome: "goals-met" });
    await expect(end(2)).rejects.toMatchObject({ kind: "already-discharged" });
    const visit = await addAppointment(practice, {
      patientId: patient.id,
      day: "2026-12-01",
      time: "15:30",
      values: { episodeId: episode.id, state: "arrived" },
    });
    await expect(startNote(therapist(), { appointmentId: visit.id })).rejects.toMatchObject({
      kind: "episode-discharged",
    });
    const open = await reopenEpisode(therapist(), { episodeId: episode.id, version: ended.version });
    expect(open).toMatchObject({ state: "open", outcome: null, dischargedOn: null });
    expect((await auditOf(practice, episode.id)).map((a) => a.action)).toEqual([
      "episode.discharged",
      "episode.reopened",
    ]);
  });

  it("needs something written", async () => {
    const { episode } = await addVisit(practice);
    await expect(
      dischargeEpisode(therapist(), { episodeId: episode.id, version: 1, outcome: "moved-away" }),
    ).rejects.toMatchObject({ kind: "nothing-written" });
    await expect(reopenEpisode(therapist(), { episodeId: episode.id, version: 1 })).rejects.toMatchObject({
      kind: "still-open",
    });
    await expect(
      dischargeEpisode(contextFor(practice, "owner"), {
        episodeId: episode.id,
        version: 1,
        outcome: "moved-away",
      }),
    ).rejects.toMatchObject({ code: "forbidden" });
  });
});
