import { allocate, shareOf } from "@withy/core/money";
import { minutesOnOffer, pencePerHour, perEach, proportion } from "@withy/services/reports/arithmetic";
import { describe, expect, test } from "vitest";

// Definitions are common practice among clinics; the figures are worked by hand from them.

describe("utilisation", () => {
  const week = {
    rotaMinutes: 5 * 420,
    breakMinutes: 5 * 60,
    leaveMinutes: 0,
    adminMinutes: 0,
    closedMinutes: 0,
  };

  test("minutes on offer: a week of five days of 420 minutes with an hour's break each", () => {
    expect(minutesOnOffer(week)).toBe(1800);
    expect(minutesOnOffer({ ...week, leaveMinutes: 5000 })).toBe(0);
  });

  test.each([
    ["booked: 1,410 of 1,800 minutes", 1410, 1800, 7833],
    ["delivered: 1,260 of 1,680 minutes", 1260, 1680, 7500],
  ])("%s", (_, minutes, onOffer, share) => {
    expect(proportion(minutes, onOffer)).toBe(share);
  });
});

describe("attendance: 216 attended, 12 did not attend, 12 cancelled in time, 240 booked", () => {
  test.each([
    ["did not attend, of all booked", 12, 240, 500],
    ["did not attend, of those due", 12, 228, 526],
    ["cancelled, of all booked", 12, 240, 500],
  ])("%s", (_, part, whole, share) => {
    expect(proportion(part, whole)).toBe(share);
  });
});

describe("visits and money for each", () => {
  test("156 attended visits and 28 new patients: 5.57 each, 1 new to 4.57 follow-ups", () => {
    expect(perEach(156, 28)).toBe(557);
    expect(perEach(156 - 28, 28)).toBe(457);
  });

  test("60 visits a week at 8 visits each ask for 7.5 new patients a week", () => {
    expect(perEach(60, 8)).toBe(750);
  });

  test("1,980.00 over 23.5 hours is 84.26 an hour", () => {
    expect(pencePerHour(198_000, 23.5 * 60)).toBe(8426);
  });

  test("pay by share: the clinic has the remainder, not a rounding of its own", () => {
    expect(shareOf(198_000, 4500)).toBe(89_100);
    expect(shareOf(8425, 5500)).toBe(4634);
    expect(8425 - shareOf(8425, 5500)).toBe(3791);
    expect(allocate(8050, [60, 40])).toEqual([4830, 3220]);
  });
});

test("nothing over nothing is no data, never zero and never a number that is none", () => {
  expect(proportion(0, 0)).toBeNull();
  expect(proportion(12, 0)).toBeNull();
  expect(perEach(156, 0)).toBeNull();
  expect(pencePerHour(198_000, 0)).toBeNull();
});
