import { expect, test } from "vitest";
import { clock, minuteOf, readTime, shortClock, span } from "./minute-words";

test.each([
  ["10:15", "10:15"],
  ["10.15", "10:15"],
  ["1015", "10:15"],
  ["930", "09:30"],
  ["9", "09:00"],
  ["2", "14:00"],
  ["02:00", "02:00"],
  ["2:30pm", "14:30"],
  ["12am", "00:00"],
  ["12 pm", "12:00"],
  [" 17 ", "17:00"],
])("reads %s as %s", (typed, read) => {
  expect(readTime(typed)).toBe(read);
});

test.each(["", "25", "10:60", "13pm", "ten", "1:2", "0pm"])("does not read %j", (typed) => {
  expect(readTime(typed)).toBeNull();
});

test("minutes are written as a clock, as short hours and as a length", () => {
  expect(clock(645)).toBe("10:45");
  expect(minuteOf("10:45")).toBe(645);
  expect([480, 1050, 720, 780].map(shortClock)).toEqual(["8", "5:30", "12", "1"]);
  expect([45, 60, 195].map(span)).toEqual(["45 min", "1 h", "3 h 15"]);
});
