import type { MonthFigure } from "@withy/contracts/reports";
import { expect, test } from "vitest";
import { changeWords, figureWords, hoursWords, madeOfWords, percentWords, pointsWords } from "./figure-words";

const figure = (values: Partial<MonthFigure>): MonthFigure => ({
  key: "booked",
  unit: "share",
  value: null,
  before: null,
  numerator: 0,
  denominator: 0,
  of: null,
  definition: "",
  ...values,
});

test.each([
  [null, "no data"],
  [0, "0%"],
  [387, "3.9%"],
  [400, "4%"],
  [8333, "83%"],
  [9950, "100%"],
])("a share of %s basis points reads %s", (basisPoints, words) => {
  expect(percentWords(basisPoints)).toBe(words);
});

test.each([
  [0, "0"],
  [90, "1.5"],
  [55_080, "918"],
  [66_600, "1,110"],
])("%i minutes read %s hours", (minutes, words) => {
  expect(hoursWords(minutes)).toBe(words);
});

test("a figure without a denominator has no data and nothing to compare", () => {
  expect(figureWords(figure({}))).toBe("no data");
  expect(changeWords(figure({ before: 5000 }))).toBe("no month before to compare");
  expect(pointsWords(null, 5000)).toBe("");
});

test("a change is told in the figure's own unit", () => {
  expect(changeWords(figure({ value: 8333, before: 8200 }))).toBe("up 1 point");
  expect(changeWords(figure({ value: 8333, before: 8341 }))).toBe("no change");
  expect(changeWords(figure({ unit: "pence", value: 100, before: 121_300 }))).toBe("down £1,212.00");
  expect(changeWords(figure({ unit: "count", value: 96, before: 89 }))).toBe("up 7");
  expect(pointsWords(8300, 8500)).toBe("−2");
});

test("a share says what it is out of", () => {
  const missed = figure({ key: "did-not-attend", numerator: 54, denominator: 1395 });
  expect(madeOfWords(missed)).toBe("54 of 1,395 visits due");
  expect(madeOfWords(figure({ numerator: 55_080, denominator: 66_600 }))).toBe("918 of 1,110 hours on offer");
});
