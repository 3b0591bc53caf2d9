import { exerciseLibrary } from "@withy/clinical/exercises/library";
import { newId } from "@withy/core/ids";
import {
  createProgramme,
  getExercise,
  getExerciseLibrary,
  getProgramme,
  issueProgramme,
  listProgrammes,
  renderHandout,
  saveProgramme,
} from "@withy/services/clinical";
import { beforeAll, describe, expect, it } from "vitest";
import { contextFor } from "../../support/contexts";
import { addEpisode, addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";

let practice: TestPractice;
let other: TestPractice;
let ids: { patientId: string; episodeId: string; programmeId: string };

beforeAll(async () => {
  practice = await buildPractice();
  other = await buildPractice();
  const patient = await addPatient(practice);
  const episode = await addEpisode(practice, patient.id);
  const programme = await createProgramme(contextFor(practice, "therapist"), { episodeId: episode.id });
  ids = { patientId: patient.id, episodeId: episode.id, programmeId: programme.id };
});

type Ctx = ReturnType<typeof contextFor>;

/** Every verb of the area, called with ids that exist in the first practice. */
const calls: [string, (ctx: Ctx) => Promise<unknown>][] = [
  ["createProgramme", (ctx) => createProgramme(ctx, { episodeId: ids.episodeId })],
  ["getProgramme", (ctx) => getProgramme(ctx, { programmeId: ids.programmeId })],
  ["listProgrammes", (ctx) => listProgrammes(ctx, { patientId: ids.patientId })],
  ["renderHandout", (ctx) => renderHandout(ctx, { programmeId: ids.programmeId })],
  ["issueProgramme", (ctx) => issueProgramme(ctx, { programmeId: ids.programmeId, version: 1 })],
  [
    "saveProgramme",
    async (ctx) => {
      const { content, title } = await getProgramme(contextFor(practice, "therapist"), {
        programmeId: ids.programmeId,
      });
      return saveProgramme(ctx, {
        programmeId: ids.programmeId,
        version: 1,
        title,
        content: structuredClone(content) as never,
      });
    },
  ],
];

describe.each(calls)("%s", (_, call) => {
  it.each(["owner", "receptionist", "accounts"] as const)("is forbidden to the %s", async (person) => {
    await expect(call(contextFor(practice, person))).rejects.toMatchObject({ code: "forbidden" });
  });

  it("finds nothing of another practice", async () => {
    await expect(call(contextFor(other, "therapist"))).rejects.toMatchObject({ code: "not-found" });
  });
});

describe("reach between sites", () => {
  it("a therapist of another site alone finds neither the programme nor its episode", async () => {
    const roles = [{ role: "therapist" as const, siteId: practice.sites.tollhouse.id }];
    const ctx = contextFor(practice, "otherTherapist", { roles });
    await expect(getProgramme(ctx, { programmeId: ids.programmeId })).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(createProgramme(ctx, { episodeId: ids.episodeId })).rejects.toMatchObject({
      code: "not-found",
    });
    expect((await listProgrammes(ctx, { patientId: ids.patientId })).programmes).toEqual([]);
  });

  it("answers an unknown id and an unknown version alike", async () => {
    const ctx = contextFor(practice, "therapist");
    await expect(getProgramme(ctx, { programmeId: newId() })).rejects.toMatchObject({ code: "not-found" });
    await expect(getProgramme(ctx, { programmeId: ids.programmeId, versionNumber: 9 })).rejects.toMatchObject(
      {
        code: "not-found",
      },
    );
  });
});

describe("the exercise library", () => {
  it("is searched and filtered for those who treat", async () => {
    const ctx = contextFor(practice, "therapist");
    const all = await getExerciseLibrary(ctx, {});
    expect(all.exercises).toHaveLength(exerciseLibrary.length);
    const hips = await getExerciseLibrary(ctx, { region: "hip", words: "bridge" });
    expect(hips.exercises[0]?.key).toBe("bridge");
    const bare = await getExerciseLibrary(ctx, { equipment: "none" });
    expect(bare.exercises.every((e) => e.forms.some((f) => f.needs.length === 0))).toBe(true);
    await expect(getExerciseLibrary(contextFor(practice, "receptionist"), {})).rejects.toMatchObject({
      code: "forbidden",
    });
  });

  it("shows one exercise with the neighbours of its ladder", async () => {
    const ctx = contextFor(practice, "therapist");
    expect(await getExercise(ctx, { key: "step-up" })).toMatchObject({
      name: "Step up",
      harderExercise: { key: "step-down" },
    });
    await expect(getExercise(ctx, { key: "nothing" })).rejects.toMatchObject({ code: "not-found" });
  });
});
