import { createHash } from "node:crypto";
import { signedForm } from "@withy/clinical/notes/note-text";
import { noteAddenda, notes, noteVersions, staffMembers } from "@withy/db/schema";
import {
  addAddendum,
  getDayList,
  listUnsignedNotes,
  saveNoteDraft,
  signNote,
} from "@withy/services/clinical";
import { and, eq } from "drizzle-orm";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import { auditOf } from "../../support/audit-rows";
import { asDatabaseOwner } from "../../support/connection";
import { contextFor } from "../../support/contexts";
import { buildPractice, type TestPractice, testNow } from "../../support/practice";
import { addNote, addVisit } from "./visit-with-note";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});
beforeEach(() => practice.clock.set(testNow));

const therapist = () => contextFor(practice, "therapist");

/** The server's own error number. */
async function errnoOf(work: Promise<unknown>): Promise<number | null> {
  try {
    await work;
    return null;
  } catch (error) {
    return (error as { errno?: number }).errno ?? null;
  }
}

describe("signing", () => {
  it("prints name, registration number and time, and keeps the hash of the exact words", async () => {
    const { noteId, version, patient } = await addNote(practice, { isWritten: true });
    practice.clock.advance(30);
    const signed = await signNote(therapist(), { noteId, version });
    expect(signed).toMatchObject({
      state: "signed",
      canWrite: false,
      signedName: "Ana Ferreby",
      registrationNumber: "PH100002",
      signedAt: "2026-12-01T09:30:00.000Z",
      isLateEntry: false,
    });
    const form = signedForm(
      {
        noteId,
        patientId: patient.id,
        kind: "initial",
        visitAt: signed.visitAt,
        signedAt: signed.signedAt ?? "",
        signedName: "Ana Ferreby",
        registrationNumber: "PH100002",
      },
      signed.body,
    );
    expect(signed.bodyHash).toBe(createHash("sha256").update(form, "utf8").digest("hex"));
    expect((await auditOf(practice, noteId)).map((row) => row.action)).toEqual([
      "note.started",
      "note.saved",
      "note.signed",
    ]);
    const kept = await practice.db
      .select()
      .from(noteVersions)
      .where(and(eq(noteVersions.practiceId, practice.practiceId), eq(noteVersions.noteId, noteId)));
    expect(kept.at(-1)).toMatchObject({ version: signed.version, body: signed.body });
  });

  it("says that an entry on a later day is late", async () => {
    const { noteId, version } = await addNote(practice, { isWritten: true });
    practice.clock.set("2026-12-02T08:05:00Z");
    const signed = await signNote(therapist(), { noteId, version });
    expect(signed.isLateEntry).toBe(true);
    expect(signed.entryWords).toContain("Late entry, written 2 December 2026 at 08:05");
  });

  it("names the headings that are empty", async () => {
    const { noteId, version } = await addNote(practice);
    await expect(signNote(therapist(), { noteId, version })).rejects.toMatchObject({
      kind: "headings-empty",
      fields: [{ field: "body.history" }],
    });
  });

  it("refuses someone else, an old version, a second time, and a person without a number", async () => {
    const { noteId, version } = await addNote(practice, { isWritten: true });
    await expect(signNote(contextFor(practice, "otherTherapist"), { noteId, version })).rejects.toMatchObject(
      { kind: "not-the-author" },
    );
    await expect(signNote(therapist(), { noteId, version: version - 1 })).rejects.toMatchObject({
      code: "stale",
    });
    const own = and(
      eq(staffMembers.practiceId, practice.practiceId),
      eq(staffMembers.id, practice.staff.therapist.id),
    );
    await practice.db.update(staffMembers).set({ registrationNumber: null }).where(own);
    await expect(signNote(therapist(), { noteId, version })).rejects.toMatchObject({
      kind: "no-registration-number",
    });
    await practice.db.update(staffMembers).set({ registrationNumber: "PH100002" }).where(own);
    const signed = await signNote(therapist(), { noteId, version });
    await expect(signNote(therapist(), { noteId, version: signed.version })).rejects.toMatchObject({
      kind: "note-signed",
    });
    await expect(
      saveNoteDraft(therapist(), { noteId, version: signed.version, body: { plan: "New" } }),
    ).rejects.toMatchObject({ kind: "note-signed" });
  });

  it("of two at once one signs", async () => {
    const { noteId, version } = await addNote(practice, { isWritten: true });
    const both = await Promise.allSettled([1, 2].map(() => signNote(therapist(), { noteId, version })));
    expect(both.filter((r) => r.status === "fulfilled")).toHaveLength(1);
  });
});

describe("a signed note in the database", () => {
  it("cannot be changed or deleted by the app's user, nor changed by the schema's owner", async () => {
    const { noteId, version } = await addNote(practice, { isWritten: true });
    const { version: signedVersion } = await signNote(therapist(), { noteId, version });
    const row = and(eq(notes.practiceId, practice.practiceId), eq(notes.id, noteId));
    expect(
      await errnoOf(
        practice.db
          .update(notes)
          .set({ body: { plan: "Forged" } })
          .where(row),
      ),
    ).toBe(1644);
    expect(await errnoOf(practice.db.update(notes).set({ state: "draft" }).where(row))).toBe(1644);
    expect(await errnoOf(practice.db.delete(notes).where(row))).toBe(1142);
    await asDatabaseOwner(async (owner) => {
      expect(await errnoOf(owner.query("update notes set body = '{}' where id = ?", [noteId]))).toBe(1644);
      expect(await errnoOf(owner.query("delete from notes where id = ?", [noteId]))).not.toBeNull();
    });
    const [after] = await practice.db.select().from(notes).where(row);
    expect(after).toMatchObject({ state: "signed", version: signedVersion });
  });

  it("its history and addenda can be added to but not changed", async () => {
    const { noteId, version } = await addNote(practice, { isWritten: true });
    await signNote(therapist(), { noteId, version });
    await addAddendum(therapist(), { noteId, reason: "Forgot a figure", text: "Right hip 120." });
    const ofNote = and(eq(noteVersions.practiceId, practice.practiceId), eq(noteVersions.noteId, noteId));
    const addenda = and(eq(noteAddenda.practiceId, practice.practiceId), eq(noteAddenda.noteId, noteId));
    expect(await errnoOf(practice.db.update(noteVersions).set({ body: {} }).where(ofNote))).toBe(1142);
    expect(await errnoOf(practice.db.delete(noteVersions).where(ofNote))).toBe(1142);
    expect(await errnoOf(practice.db.update(noteAddenda).set({ text: "" }).where(addenda))).toBe(1142);
    expect(await errnoOf(practice.db.delete(noteAddenda).where(addenda))).toBe(1142);
  });
});

describe("addenda", () => {
  it("stand under the name of whoever adds them, with the reason", async () => {
    const { noteId, version } = await addNote(practice, { isWritten: true });
    const signed = await signNote(therapist(), { noteId, version });
    const after = await addAddendum(contextFor(practice, "owningTherapist"), {
      noteId,
      reason: "Result came in",
      text: "X-ray report read: no fracture.",
    });
    expect(after.body).toEqual(signed.body);
    expect(after.addenda).toMatchObject([
      { authorName: "Idris Vane", registrationNumber: "PH100001", reason: "Result came in" },
    ]);
    expect((await auditOf(practice, noteId)).at(-1)?.action).toBe("note.addendum-added");
  });

  it("need a signed note, a reason and words", async () => {
    const { noteId } = await addNote(practice, { isWritten: true });
    await expect(addAddendum(therapist(), { noteId, reason: "Forgot", text: "More" })).rejects.toMatchObject({
      kind: "note-not-signed",
    });
    await expect(addAddendum(therapist(), { noteId, reason: " ", text: "" })).rejects.toMatchObject({
      code: "invalid",
      fields: [{ field: "reason" }, { field: "text" }],
    });
  });
});

describe("what waits for a name", () => {
  it("lists drafts with what they lack and finished visits without a note, for their own therapist", async () => {
    const begun = await addNote(practice);
    const unwritten = await addVisit(practice);
    practice.clock.set("2026-12-01T18:00:00Z");
    const items = await listUnsignedNotes(therapist(), {});
    expect(items.find((item) => item.noteId === begun.noteId)?.emptyHeadings).toContain("History");
    expect(items.find((item) => item.appointmentId === unwritten.visit.id)).toMatchObject({
      noteId: null,
      patientId: unwritten.patient.id,
    });
    const others = await listUnsignedNotes(contextFor(practice, "owningTherapist"), {});
    expect(others).toEqual([]);
    await expect(listUnsignedNotes(contextFor(practice, "receptionist"), {})).rejects.toMatchObject({
      code: "forbidden",
    });
  });

  it("the day list says how far each note has come, and is audited", async () => {
    const signed = await addNote(practice, { isWritten: true });
    await signNote(therapist(), { noteId: signed.noteId, version: signed.version });
    const begun = await addNote(practice);
    const booked = await addVisit(practice, { isInSession: false });
    const list = await getDayList(therapist(), {});
    const noteOf = (appointmentId: string) =>
      list.visits.find((visit) => visit.appointmentId === appointmentId)?.note;
    expect(list.day).toBe("2026-12-01");
    expect(noteOf(signed.visit.id)).toMatchObject({ state: "signed" });
    expect(noteOf(begun.visit.id)).toMatchObject({ state: "draft" });
    expect(noteOf(booked.visit.id)).toBeNull();
    expect((await auditOf(practice, practice.staff.therapist.id)).map((row) => row.action)).toContain(
      "day-list.read",
    );
    expect((await getDayList(contextFor(practice, "otherTherapist"), {})).visits).toEqual([]);
    await expect(getDayList(contextFor(practice, "owner"), {})).rejects.toMatchObject({ code: "forbidden" });
  });
});
