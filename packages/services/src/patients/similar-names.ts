import { foldName } from "@withy/core/names";

interface FullName {
  givenName: string;
  familyName: string;
}

/**
 * Whether two names may be one person's: the same words in any order, one family name with given names that start
 * alike, or a slip of at most two letters. A hint for a person who decides, never a decision.
 */
export function areSimilarNames(a: FullName, b: FullName): boolean {
  const [one, two] = [wordsOf(a), wordsOf(b)];
  if (one.sorted === two.sorted) return true;
  if (one.family === two.family && startsAlike(one.given, two.given)) return true;
  return lettersApart(one.sorted, two.sorted) <= 2;
}

function wordsOf({ givenName, familyName }: FullName) {
  const given = foldName(givenName);
  const family = foldName(familyName);
  return { given, family, sorted: `${given} ${family}`.split(" ").sort().join(" ") };
}

function startsAlike(a: string, b: string): boolean {
  const shorter = Math.min(a.length, b.length, 3);
  return shorter > 0 && a.slice(0, shorter) === b.slice(0, shorter);
}

/** Levenshtein distance: letters to add, drop or change. */
function lettersApart(a: string, b: string): number {
  let above = Array.from({ length: b.length + 1 }, (_, i) => i);
  for (const [i, letter] of [...a].entries()) {
    const row = [i + 1];
    for (let j = 0; j < b.length; j += 1) {
      const change = (above[j] ?? 0) + (letter === b[j] ? 0 : 1);
      row.push(Math.min(change, (above[j + 1] ?? 0) + 1, (row[j] ?? 0) + 1));
    }
    above = row;
  }
  return above[b.length] ?? 0;
}
