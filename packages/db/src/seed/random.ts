/** A generator that gives the same numbers for the same start, so that two seedings of one day are alike. */
export interface Random {
  /** From 0 up to, and without, 1. */
  next(): number;
  /** A whole number, both ends included. */
  int(from: number, to: number): number;
  chance(share: number): boolean;
  pick<T>(list: readonly T[]): T;
}

/** Mulberry32, a 32-bit generator in the public domain; plenty for a scenario, nothing for a secret. */
export function makeRandom(start: number): Random {
  let state = start >>> 0;
  const next = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
  const int = (from: number, to: number) => from + Math.floor(next() * (to - from + 1));
  return {
    next,
    int,
    chance: (share) => next() < share,
    pick: (list) => {
      const found = list[int(0, list.length - 1)];
      if (found === undefined) throw new RangeError("Cannot pick from an empty list.");
      return found;
    },
  };
}

/** Ids in the form of UUID version 7 that rise by a millisecond each, so that rows made together lie together. */
export function makeIds(random: Random, from: Date): () => string {
  let at = from.getTime();
  const hex = (digits: number) =>
    Math.floor(random.next() * 16 ** digits)
      .toString(16)
      .padStart(digits, "0");
  return () => {
    at += 1;
    const time = at.toString(16).padStart(12, "0");
    const variant = (8 + random.int(0, 3)).toString(16);
    return `${time.slice(0, 8)}-${time.slice(8)}-7${hex(3)}-${variant}${hex(3)}-${hex(6)}${hex(6)}`;
  };
}
