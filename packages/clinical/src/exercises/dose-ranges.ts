import type { DoseRange } from "./exercise";

/**
 * Usual doses. Repetitions and sets for strength span the ranges for starters, for older starters and for
 * endurance in the American College of Sports Medicine's 2011 position (as quoted in secondary sources);
 * stretches are held 10 to 30 seconds (1998 position). Work and rest of timed intervals: common practice.
 */
export const strengthDose: DoseRange = {
  sets: [1, 4],
  repetitions: [8, 15],
  holdSeconds: [0, 10],
  repetitionSeconds: [3, 8],
  restSeconds: [0, 180],
  workSeconds: [15, 60],
};

export const enduranceDose: DoseRange = { ...strengthDose, sets: [1, 2], repetitions: [15, 25] };

export const holdDose: DoseRange = {
  sets: [1, 4],
  repetitions: [3, 10],
  holdSeconds: [5, 45],
  repetitionSeconds: [1, 4],
  restSeconds: [0, 120],
  workSeconds: [10, 60],
};

export const mobilityDose: DoseRange = {
  sets: [1, 3],
  repetitions: [5, 15],
  holdSeconds: [0, 10],
  repetitionSeconds: [2, 8],
  restSeconds: [0, 60],
  workSeconds: [20, 60],
};

export const stretchDose: DoseRange = {
  sets: [1, 2],
  repetitions: [2, 4],
  holdSeconds: [10, 30],
  repetitionSeconds: [2, 4],
  restSeconds: [0, 60],
  workSeconds: [20, 60],
};

export const balanceDose: DoseRange = {
  sets: [1, 4],
  repetitions: [1, 10],
  holdSeconds: [0, 45],
  repetitionSeconds: [2, 8],
  restSeconds: [0, 90],
  workSeconds: [15, 60],
};

export const aerobicDose: DoseRange = {
  sets: [1, 6],
  repetitions: [1, 40],
  holdSeconds: [0, 0],
  repetitionSeconds: [1, 60],
  restSeconds: [0, 180],
  workSeconds: [20, 1800],
};
