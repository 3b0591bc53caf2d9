import {
  checkLetterReader,
  getLetter,
  getLetterLink,
  openLinkedLetter,
  sendLetter,
} from "@withy/services/letters";
import { beforeAll, describe, expect, it } from "vitest";
import { auditOf, messagesAbout } from "../../support/audit-rows";
import { systemContextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import { addSigned, therapistOf, tokenIn } from "./letter-steps";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildPractice();
});

/** Every patient of these tests is born on 22 June 1954. */
const right = "22 6 1954";
const wrong = "23 6 1954";

async function addLink() {
  const { letter, patient } = await addSigned(practice);
  await sendLetter(therapistOf(practice), { letterId: letter.id, to: "recipient", channel: "email" });
  const token = tokenIn(JSON.stringify((await messagesAbout(practice, letter.id))[0]?.payload));
  return { letter, patient, token };
}

const open = (token: string, bornOn: string) =>
  openLinkedLetter(systemContextFor(practice), { token, bornOn });
const check = (token: string, bornOn: string) =>
  checkLetterReader(systemContextFor(practice), { token, bornOn });

const refusalOf = (work: Promise<unknown>) =>
  work.then(
    () => "opened",
    (error) => error.kind,
  );

const actionsOf = async (letterId: string) => (await auditOf(practice, letterId)).map((row) => row.action);
const times = async (letterId: string, action: string) =>
  (await actionsOf(letterId)).filter((one) => one === action).length;

describe("the private page of a letter", () => {
  it("says who wrote and until when, and nothing about whom", async () => {
    const { letter, patient, token } = await addLink();
    const link = await getLetterLink(systemContextFor(practice), token);
    expect(link).toMatchObject({
      practice: "Marram Physiotherapy",
      reference: letter.reference,
      expiresOn: "2026-12-31",
    });
    const said = JSON.stringify(link);
    for (const secret of [patient.familyName, patient.givenName, "1954"]) expect(said).not.toContain(secret);
    expect((await actionsOf(letter.id)).at(-1)).toBe("letter.sent");
  });

  it.each(["22 6 1954", " 22/06/54 ", "22 June 1954", "1954-06-22"])("opens for %j", async (typed) => {
    const { letter, patient, token } = await addLink();
    await check(token, typed);
    expect(await times(letter.id, "letter.opened"), "a check opens nothing").toBe(0);
    const file = await open(token, typed);
    expect(file.bytes.subarray(0, 5).toString()).toBe("%PDF-");
    expect(file.filename).toBe(`letter-${letter.reference}.pdf`);
    const seen = await getLetter(therapistOf(practice), { letterId: letter.id });
    expect(seen.deliveries[0]?.firstOpenedAt).toBe("2026-12-01T09:00:00.000Z");
    const opened = (await auditOf(practice, letter.id)).find((row) => row.action === "letter.opened");
    expect(opened).toMatchObject({ patientId: patient.id, actorId: null });
  });

  it("opens again and again, and asks for the date each time", async () => {
    const { letter, token } = await addLink();
    await open(token, right);
    expect(await refusalOf(open(token, ""))).toBe("invalid");
    expect(await refusalOf(open(token, wrong))).toBe("wrong-date");
    await open(token, right);
    expect(await times(letter.id, "letter.opened")).toBe(2);
  });

  it.each(["", "   ", "not a date", "31 2 1954", "14", "x".repeat(50)])(
    "asks again for %j, which is no date and costs no try",
    async (typed) => {
      const { letter, token } = await addLink();
      for (let i = 0; i < 6; i += 1)
        await expect(open(token, typed)).rejects.toMatchObject({
          code: "invalid",
          fields: [{ field: "bornOn" }],
        });
      await open(token, right);
      expect(await times(letter.id, "letter.refused")).toBe(0);
    },
  );

  it("is for the date of its own patient, whoever else was born on another", async () => {
    const { letter, token } = await addLink();
    const refused = check(token, wrong);
    await expect(refused).rejects.toMatchObject({ code: "refused", fields: [{ field: "bornOn" }] });
    await expect(refused).rejects.not.toThrow(/1954|22/);
    expect(await times(letter.id, "letter.refused")).toBe(1);
    expect(await times(letter.id, "letter.opened")).toBe(0);
  });
});

describe("guessing at the date", () => {
  it("waits a quarter of an hour after five wrong dates, for the right one too, and only on this link", async () => {
    const { letter, token } = await addLink();
    const other = await addLink();
    for (let i = 0; i < 5; i += 1) {
      expect(await refusalOf(i % 2 === 0 ? check(token, wrong) : open(token, wrong))).toBe("wrong-date");
      practice.clock.advance(2);
    }
    await expect(open(token, right)).rejects.toMatchObject({
      kind: "too-many-tries",
      message: "Too many tries. Wait 13 minutes, then type the date again.",
    });
    expect(await refusalOf(check(token, right))).toBe("too-many-tries");
    await open(other.token, right);
    practice.clock.advance(13);
    await open(token, right);
    expect(await times(letter.id, "letter.refused")).toBe(5);
  });

  it("counts dates that are sent at once", async () => {
    const { token } = await addLink();
    const answers = await Promise.all(Array.from({ length: 12 }, () => refusalOf(open(token, wrong))));
    expect(answers.filter((kind) => kind === "wrong-date")).toHaveLength(5);
    expect(answers.filter((kind) => kind === "too-many-tries")).toHaveLength(7);
  });

  it("starts anew after a right date", async () => {
    const { token } = await addLink();
    for (let round = 0; round < 3; round += 1) {
      for (let i = 0; i < 4; i += 1) expect(await refusalOf(open(token, wrong))).toBe("wrong-date");
      await open(token, right);
    }
  });
});

describe("a link that is none", () => {
  it("ended after 30 days, with the right date too", async () => {
    const { token } = await addLink();
    const clock = { now: () => new Date(practice.clock.now().getTime() + 30 * 24 * 60 * 60_000) };
    const later = { ...systemContextFor(practice), clock };
    await expect(getLetterLink(later, token)).rejects.toMatchObject({ code: "not-found" });
    await expect(openLinkedLetter(later, { token, bornOn: right })).rejects.toMatchObject({
      code: "not-found",
    });
  });

  it("was not copied whole or was made up", async () => {
    const { token } = await addLink();
    const flipped = `${token.startsWith("A") ? "B" : "A"}${token.slice(1)}`;
    for (const made of ["", "x", "A".repeat(43), flipped, token.slice(1), `${token}x`, "../../etc/passwd"]) {
      await expect(getLetterLink(systemContextFor(practice), made)).rejects.toMatchObject({
        code: "not-found",
      });
      await expect(open(made, right)).rejects.toMatchObject({ code: "not-found" });
    }
  });
});
