import { can } from "@withy/core/access/can";
import { isAppError } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import type { Context } from "@withy/services/context";
import { beforeAll, describe, expect, test } from "vitest";
import { contextFor } from "../../support/contexts";
import { buildPractice, type TestPractice } from "../../support/practice";
import type { TestPerson } from "../../support/practice-staff";
import { type NamedVerb, verbs } from "../../support/verbs";
import { type RowBook, writeRowBook } from "./row-book";
import { sampleInput, withId } from "./sample-input";

const people: readonly TestPerson[] = ["owner", "therapist", "receptionist", "accounts", "owningTherapist"];
let practice: TestPractice;
let own: RowBook;
let foreign: RowBook;

beforeAll(async () => {
  practice = await buildPractice();
  own = await writeRowBook(practice);
  foreign = await writeRowBook(await buildPractice({ name: "Cairn & Firth Clinics" }));
});

type Outcome = { answer: string } | { code: string; kind: string; message: string };

/** What came of it without the id in question and the time taken, so that two outcomes can be held against each other. */
async function outcomeOf({ verb }: NamedVerb, ctx: Context, input: unknown, id: string): Promise<Outcome> {
  try {
    const answer = await verb(ctx, input as never);
    const text = JSON.stringify(answer ?? null).replaceAll(/"tookMs":\d+/g, '"tookMs":0');
    return { answer: id === "" ? text : text.replaceAll(id, "this id") };
  } catch (error) {
    if (!isAppError(error)) throw error;
    return { code: error.code, kind: error.kind, message: error.message };
  }
}

const holderOf = ({ verb }: NamedVerb): TestPerson => {
  const holder = people.find((person) => can(practice.staff[person].roles, verb.permission));
  if (!holder) throw new Error(`No one holds ${verb.permission}.`);
  return holder;
};

const table = verbs.map((one) => [`${one.area}.${one.name}`, one] as const);

test("the verbs are found", () => {
  expect(verbs.length).toBeGreaterThan(70);
});

describe("a role that lacks the permission is refused, whatever it sends", () => {
  test.each(table)("%s", async (_name, one) => {
    const { sample } = sampleInput(one.verb.input, own);
    for (const person of people) {
      const ctx = contextFor(practice, person);
      if (can(ctx.roles, one.verb.permission)) continue;
      for (const input of [sample, {}])
        expect(await outcomeOf(one, ctx, input, ""), person).toMatchObject({ code: "forbidden" });
    }
  });
});

describe("an unknown property is refused", () => {
  test.each(table)("%s", async (_name, one) => {
    const { sample } = sampleInput(one.verb.input, own);
    const sent = { ...sample, practiceId: foreign.patientId };
    expect(await outcomeOf(one, contextFor(practice, holderOf(one)), sent, "")).toMatchObject({
      code: "invalid",
    });
  });
});

/** Stands in for the rows while the tests are listed, before any row exists. */
const anyRow: RowBook = new Proxy({}, { get: () => "some-row" });

/** Lists and reports take ids as wishes: what no row of the practice fits is an empty answer. */
const onlyReads = /^(list|get|find|count|who|draftInvoices)/;

describe("another practice's row and a missing one answer the same", () => {
  const named = table.filter(([, one]) =>
    JSON.stringify(sampleInput(one.verb.input, anyRow)).includes("some-row"),
  );
  test.each(named)("%s", async (_name, one) => {
    const { sample, places } = sampleInput(one.verb.input, own);
    expect(one.verb.input.safeParse(sample).error?.issues ?? [], "the sample is a sound input").toEqual([]);
    const ctx = contextFor(practice, holderOf(one));
    for (const { path, name } of places) {
      const [theirs, nobodys] = [foreign[name] ?? "", newId()];
      const ofTheirs = await outcomeOf(one, ctx, withId(sample, path, theirs), theirs);
      const ofNobodys = await outcomeOf(one, ctx, withId(sample, path, nobodys), nobodys);
      expect(ofTheirs, path.join(".")).toEqual(ofNobodys);
      if (!onlyReads.test(one.name)) expect(ofTheirs, path.join(".")).not.toHaveProperty("answer");
    }
  });
});
