import type { Programme } from "./programme";

export interface TimelineStep {
  readonly kind: "work" | "rest" | "round-rest";
  readonly startSecond: number;
  readonly seconds: number;
  readonly round: number;
  /** Place of the item in the programme, from 0; null in the rest between rounds. */
  readonly item: number | null;
  readonly side: "both" | "left" | "right";
}

/**
 * The whole timed session step by step, as a timer follows it. Its steps add up to the session's time.
 * Steps of no length are left out.
 */
export function timeline(programme: Programme): TimelineStep[] {
  const steps: TimelineStep[] = [];
  let at = 0;
  const push = (step: Omit<TimelineStep, "startSecond">) => {
    if (step.seconds === 0) return;
    steps.push({ ...step, startSecond: at });
    at += step.seconds;
  };
  for (let round = 1; round <= programme.rounds; round += 1) {
    for (const [index, item] of programme.items.entries()) {
      const sides = item.side === "each" ? (["left", "right"] as const) : ([item.side] as const);
      for (const [turn, side] of sides.entries()) {
        push({ kind: "work", seconds: item.workSeconds, round, item: index, side });
        const isLast =
          round === programme.rounds && index === programme.items.length - 1 && turn === sides.length - 1;
        if (isLast && programme.lastRest === "dropped") continue;
        push({ kind: "rest", seconds: item.restSeconds, round, item: index, side });
      }
    }
    if (round < programme.rounds && programme.items.length > 0) {
      push({
        kind: "round-rest",
        seconds: programme.restBetweenRoundsSeconds,
        round,
        item: null,
        side: "both",
      });
    }
  }
  return steps;
}
