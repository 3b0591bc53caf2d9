import type { FigureKey, ListFigureRowsInput } from "@withy/contracts/reports";
import { getMonth, listFigureRows } from "@withy/services/reports";
import { beforeAll, expect, test } from "vitest";
import { contextFor } from "../../support/contexts";
import type { TestPractice } from "../../support/practice";
import { buildNovember, fullDay } from "./build-november";

let practice: TestPractice;
beforeAll(async () => {
  practice = await buildNovember();
});

const owner = () => contextFor(practice, "owner");
const november = () => getMonth(owner(), { month: "2026-11" });

async function figure(key: FigureKey) {
  const found = (await november()).figures.find((f) => f.key === key);
  if (!found) throw new Error(`There is no figure ${key}.`);
  return found;
}

async function rows(input: Omit<ListFigureRowsInput, "month">) {
  return listFigureRows(owner(), { month: "2026-11", pageSize: 100, ...input });
}

test.each(["booked", "delivered"] as const)("%s minutes, and the minutes on offer", async (key) => {
  const { numerator, denominator } = await figure(key);
  const answer = await rows({ figure: key });
  expect(answer.sumMinutes).toBe(numerator);
  expect(answer.rows.reduce((n, row) => n + (row.minutes ?? 0), 0)).toBe(numerator);
  const offered = await rows({ figure: "on-offer" });
  expect(offered.sumMinutes).toBe(denominator);
});

test.each(["did-not-attend", "cancelled", "new-patients"] as const)(
  "%s and what it is out of",
  async (key) => {
    const { numerator, denominator, of } = await figure(key);
    expect(await rows({ figure: key })).toMatchObject({ total: numerator });
    if (of) expect(await rows({ figure: of })).toMatchObject({ total: denominator });
  },
);

test.each(["billed", "collected"] as const)("%s", async (key) => {
  const { value } = await figure(key);
  const answer = await rows({ figure: key });
  expect(answer.sumPence).toBe(value);
  expect(answer.rows.reduce((n, row) => n + (row.pence ?? 0), 0)).toBe(value);
  expect(answer.total).toBe(answer.rows.length);
});

test("one therapist's and one kind of payer's, page by page", async () => {
  const therapistId = practice.staff.therapist.id;
  expect(await rows({ figure: "booked", therapistId })).toMatchObject({ sumMinutes: 135, total: 4 });
  expect(await rows({ figure: "on-offer", therapistId })).toMatchObject({
    sumMinutes: 21 * fullDay - 2 * fullDay - 240,
  });
  expect(await rows({ figure: "billed", payerKind: "insurer" })).toMatchObject({
    sumPence: 6100,
    total: 1,
  });
  const second = await rows({ figure: "all-visits", page: 2, pageSize: 5 });
  expect(second).toMatchObject({ total: 7, page: 2 });
  expect(second.rows).toHaveLength(2);
});
