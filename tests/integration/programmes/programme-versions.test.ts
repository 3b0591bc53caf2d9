import { newItems } from "@withy/clinical/programmes/new-item";
import type { Programme } from "@withy/clinical/programmes/programme";
import { isAppError } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import {
  createProgramme,
  getProgramme,
  issueProgramme,
  listProgrammes,
  renderHandout,
  saveProgramme,
} from "@withy/services/clinical";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { asDatabaseOwner } from "../../support/connection";
import { contextFor } from "../../support/contexts";
import { addEpisode, addPatient } from "../../support/people";
import { buildPractice, type TestPractice } from "../../support/practice";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});

const hipSession = [
  "sit-to-stand",
  "step-up",
  "bridge",
  "side-leg-lift",
  "heel-raise",
  "hip-hinge",
  "backward-leg-reach",
];
const itemsOf = (...keys: string[]) => keys.flatMap((key) => newItems(key, "timed", newId));

async function start() {
  const patient = await addPatient(practice);
  const episode = await addEpisode(practice, patient.id);
  const ctx = contextFor(practice, "therapist");
  const programme = await createProgramme(ctx, { episodeId: episode.id });
  return { patient, episode, ctx, programme };
}

async function save(
  ctx: ReturnType<typeof contextFor>,
  programme: { id: string; version: number; title: string; content: Programme },
  change: Partial<Programme>,
) {
  return saveProgramme(ctx, {
    programmeId: programme.id,
    version: programme.version,
    title: programme.title,
    content: structuredClone({ ...programme.content, ...change }) as never,
  });
}

const refusedWith = (kind: string) => (error: unknown) => isAppError(error) && error.kind === kind;

describe("starting and saving", () => {
  it("starts empty, named by its place in the row of programmes, and is saved to exactly 20:00", async () => {
    const { ctx, programme } = await start();
    expect(programme).toMatchObject({
      title: "Programme 1",
      versionNumber: 1,
      isIssued: false,
      canWrite: true,
      sessionSeconds: 0,
      episode: { place: "Left hip", isOpen: true },
    });
    const saved = await save(ctx, programme, { items: itemsOf(...hipSession) });
    expect(saved.content.items).toHaveLength(10);
    expect(saved.sessionSeconds).toBe(1200);
    expect(saved.weekSeconds).toBe(3600);
    expect(saved.version).toBe(programme.version + 1);
    const read = await getProgramme(ctx, { programmeId: programme.id });
    expect(read.content).toEqual(saved.content);
    expect((await auditOf(practice, programme.id)).map((row) => row.action)).toEqual([
      "programme.created",
      "programme.saved",
      "programme.read",
    ]);
  });

  it("starts from an earlier programme of the same patient only", async () => {
    const first = await start();
    const saved = await save(first.ctx, first.programme, { items: itemsOf("bridge") });
    const copy = await createProgramme(first.ctx, { episodeId: first.episode.id, copyOf: saved.id });
    expect(copy.title).toBe("Programme 2");
    expect(copy.content).toEqual(saved.content);
    const other = await start();
    await expect(
      createProgramme(other.ctx, { episodeId: other.episode.id, copyOf: saved.id }),
    ).rejects.toSatisfy(refusedWith("not-found"));
  });

  it("creates once for one key", async () => {
    const { episode } = await start();
    const ctx = contextFor(practice, "therapist", { idempotencyKey: newId() });
    const [a, b] = [
      await createProgramme(ctx, { episodeId: episode.id }),
      await createProgramme(ctx, { episodeId: episode.id }),
    ];
    expect(a.id).toBe(b.id);
  });

  it("refuses an old version and hands over what the other one saved", async () => {
    const { ctx, programme } = await start();
    await save(ctx, programme, { items: itemsOf("bridge") });
    const late = save(ctx, programme, { items: itemsOf("clam") });
    await expect(late).rejects.toMatchObject({ code: "stale", detail: { version: 2 } });
    expect((await getProgramme(ctx, { programmeId: programme.id })).content.items[0]?.exercise).toBe(
      "bridge",
    );
  });

  it("refuses a wrong line with its place, and leaves the stored programme as it was", async () => {
    const { ctx, programme } = await start();
    const [line] = itemsOf("step-up");
    if (!line) throw new Error("step-up is in the library");
    await expect(save(ctx, programme, { items: [{ ...line, side: "both" }] })).rejects.toMatchObject({
      kind: "side-missing",
      fields: [{ field: "items.0.side" }],
    });
    await expect(save(ctx, programme, { items: [{ ...line, workSeconds: 2 }] })).rejects.toMatchObject({
      kind: "programme-number",
      fields: [{ field: "items.0.workSeconds" }],
    });
    expect((await getProgramme(ctx, { programmeId: programme.id })).content.items).toEqual([]);
  });

  it("leaves a programme of a discharged episode alone", async () => {
    const patient = await addPatient(practice);
    const episode = await addEpisode(practice, patient.id, {
      state: "discharged",
      dischargedAt: practice.clock.now(),
      outcome: "goals-met",
    });
    await expect(
      createProgramme(contextFor(practice, "therapist"), { episodeId: episode.id }),
    ).rejects.toSatisfy(refusedWith("episode-ended"));
  });
});

describe("giving it to the patient", () => {
  it("freezes the version; the next save begins another", async () => {
    const { ctx, programme } = await start();
    const saved = await save(ctx, programme, { items: itemsOf("bridge") });
    const given = await issueProgramme(ctx, { programmeId: saved.id, version: saved.version });
    expect(given).toMatchObject({ isIssued: true, versionNumber: 1 });
    expect(given.versions[0]).toMatchObject({
      issuedBy: ctx.staffName,
      issuedAt: practice.clock.now().toISOString(),
    });

    const next = await save(ctx, given, { items: itemsOf("bridge", "clam") });
    expect(next).toMatchObject({ versionNumber: 2, isIssued: false });
    const again = await save(ctx, next, { items: itemsOf("bridge") });
    expect(again.versionNumber).toBe(2);
    const first = await getProgramme(ctx, { programmeId: saved.id, versionNumber: 1 });
    expect(first.content).toEqual(saved.content);
    expect(first.canWrite).toBe(false);
    expect(first.versions.map((v) => v.versionNumber)).toEqual([2, 1]);
  });

  it("is forbidden by the database itself to change it", async () => {
    const { ctx, programme } = await start();
    const saved = await save(ctx, programme, { items: itemsOf("bridge") });
    await issueProgramme(ctx, { programmeId: saved.id, version: saved.version });
    await asDatabaseOwner(async (connection) => {
      const change = connection.query("update programme_versions set content = '{}' where programme_id = ?", [
        saved.id,
      ]);
      await expect(change).rejects.toThrow(/issued programme version cannot be changed/);
    });
  });

  it("refuses an empty one, one twice, and one that needs what is not at home", async () => {
    const { ctx, programme } = await start();
    await expect(
      issueProgramme(ctx, { programmeId: programme.id, version: programme.version }),
    ).rejects.toSatisfy(refusedWith("programme-empty"));
    const lacking = await save(ctx, programme, {
      items: itemsOf("sit-to-stand"),
      equipmentMissing: ["chair"],
    });
    await expect(
      issueProgramme(ctx, { programmeId: lacking.id, version: lacking.version }),
    ).rejects.toSatisfy(refusedWith("equipment-missing"));
    const sound = await save(ctx, lacking, { equipmentMissing: [] });
    const given = await issueProgramme(ctx, { programmeId: sound.id, version: sound.version });
    await expect(issueProgramme(ctx, { programmeId: given.id, version: given.version })).rejects.toSatisfy(
      refusedWith("already-issued"),
    );
  });
});

describe("reading", () => {
  it("lists the patient's programmes, the last worked on first", async () => {
    const { ctx, patient, episode, programme } = await start();
    practice.clock.advance(5);
    const second = await createProgramme(ctx, { episodeId: episode.id, title: "After the holiday" });
    const list = await listProgrammes(ctx, { patientId: patient.id });
    expect(list.programmes.map((p) => p.id)).toEqual([second.id, programme.id]);
    expect(list.programmes[0]).toMatchObject({ title: "After the holiday", place: "Left hip", exercises: 0 });
    expect(list.openEpisodes.map((e) => e.id)).toEqual([episode.id]);
    expect((await auditOf(practice, patient.id)).map((row) => row.action)).toContain("programmes.listed");
  });

  it("prints the handout as a PDF and records it", async () => {
    const { ctx, programme } = await start();
    const saved = await save(ctx, programme, { items: itemsOf(...hipSession) });
    const file = await renderHandout(ctx, { programmeId: saved.id });
    expect(file.fileName).toBe("exercises-version-1.pdf");
    expect(file.bytes.subarray(0, 5).toString()).toBe("%PDF-");
    expect((await auditOf(practice, programme.id)).map((row) => row.action)).toContain("programme.printed");
  });
});
