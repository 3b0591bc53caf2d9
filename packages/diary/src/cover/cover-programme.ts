import { type CandidatePlace, type CoverVisit, visitNeedMs } from "./cover-problem";

const slotMs = 5 * 60_000;

/** A row over 0-or-1 columns: exactly one of them is chosen, or at most one. */
export interface ProgrammeRow {
  readonly kind: "one" | "most";
  readonly columns: readonly number[];
}

/** Choose columns at the least cost, within the rows. */
export interface Programme {
  readonly costs: readonly number[];
  readonly rows: readonly ProgrammeRow[];
}

/** What a column means: a visit at a place, or left where it is (place null). */
export interface CoverColumn {
  readonly visit: number;
  readonly place: CandidatePlace | null;
}

export interface CoverProgramme extends Programme {
  readonly columns: readonly CoverColumn[];
}

/** What a column takes: whoever and whatever it needs, for its whole time. A visit left where it is keeps its room. */
function takenBy(visit: CoverVisit, place: CandidatePlace | null, shared: ReadonlySet<string>): string[] {
  const patients = visit.patientIds.filter((id) => shared.has(id)).map((id) => `patient ${id}`);
  const { therapistId, roomId } = place ?? visit;
  return [`therapist ${therapistId}`, `room ${roomId}`, ...patients];
}

/** Patients of more than one of the visits: they cannot be in two places either. */
function sharedPatients(visits: readonly CoverVisit[]): Set<string> {
  const [once, twice] = [new Set<string>(), new Set<string>()];
  for (const id of visits.flatMap((v) => v.patientIds)) (once.has(id) ? twice : once).add(id);
  return twice;
}

const isWithin = (small: readonly number[], large: ReadonlySet<number>): boolean =>
  small.length <= large.size && small.every((n) => large.has(n));

/**
 * The sets of columns at the slots of one resource, less those that lie within another: their row would say nothing
 * new. Each column claims one unbroken stretch, so that a set within any other lies within a neighbour's.
 */
function largestSets(slots: ReadonlyMap<number, readonly number[]>): number[][] {
  const kept: { set: ReadonlySet<number>; held: readonly number[] }[] = [];
  for (const [, held] of [...slots].sort(([a], [b]) => a - b)) {
    let last = kept.at(-1);
    if (last && isWithin(held, last.set)) continue;
    while (last && isWithin(last.held, new Set(held))) {
      kept.pop();
      last = kept.at(-1);
    }
    kept.push({ set: new Set(held), held });
  }
  return kept.map(({ held }) => [...held]);
}

/** Which columns claim each five minutes of each resource, as one row for each distinct set of them. */
function claimRows(visits: readonly CoverVisit[], columns: readonly CoverColumn[]): ProgrammeRow[] {
  const shared = sharedPatients(visits);
  const claims = new Map<string, Map<number, number[]>>();
  for (const [n, column] of columns.entries()) {
    const visit = visits[column.visit];
    if (!visit) continue;
    const from = column.place?.startsAt ?? visit.startsAt;
    for (const resource of takenBy(visit, column.place, shared)) {
      const slots = claims.get(resource) ?? new Map<number, number[]>();
      claims.set(resource, slots);
      for (let at = from; at < from + visitNeedMs(visit); at += slotMs) {
        const held = slots.get(at);
        if (held) held.push(n);
        else slots.set(at, [n]);
      }
    }
  }
  const distinct = new Map<string, number[]>();
  for (const slots of claims.values())
    for (const held of largestSets(slots)) {
      // One visit is in one place anyway; its own columns need no row among themselves.
      if (held.some((n) => columns[n]?.visit !== columns[held[0] ?? 0]?.visit))
        distinct.set(held.join(" "), held);
    }
  return [...distinct.values()].map((held) => ({ kind: "most", columns: held }));
}

/**
 * The integer programme of a cover: one column for each candidate place and one for leaving the visit, one row for
 * each visit, one for each distinct set of columns that want the same five minutes of the same therapist, room or
 * patient. Leaving a visit costs more than all the dearest places together, so that as many as possible are placed,
 * and among those ways the cheapest is taken.
 * @param places candidate places of each visit, in the order of the visits
 */
export function coverProgramme(
  visits: readonly CoverVisit[],
  places: readonly (readonly CandidatePlace[])[],
): CoverProgramme {
  const dearest = places.map((list) => list.reduce((most, p) => Math.max(most, p.cost), 0));
  const leaving = 1 + dearest.reduce((sum, cost) => sum + cost, 0);
  const columns: CoverColumn[] = visits.flatMap((_, visit) => [
    ...(places[visit] ?? []).map((place) => ({ visit, place })),
    { visit, place: null },
  ]);
  const costs = columns.map(
    ({ visit, place }) => place?.cost ?? leaving * Math.max(1, visits[visit]?.patientIds.length ?? 1),
  );
  const ofVisit = visits.map((): number[] => []);
  for (const [n, column] of columns.entries()) ofVisit[column.visit]?.push(n);
  const placing = ofVisit.map((list): ProgrammeRow => ({ kind: "one", columns: list }));
  return { columns, costs, rows: [...placing, ...claimRows(visits, columns)] };
}

const termsEachLine = 12;

function sumText(terms: readonly string[]): string {
  const lines: string[] = [];
  for (let n = 0; n < terms.length; n += termsEachLine)
    lines.push(terms.slice(n, n + termsEachLine).join(" + "));
  return lines.join("\n + ");
}

/** The programme as text in the LP file format. Columns are called x0, x1 and so on. */
export function programmeText({ costs, rows }: Programme): string {
  const lines = rows.map(
    ({ kind, columns }, n) =>
      ` r${n}: ${sumText(columns.map((c) => `x${c}`))} ${kind === "one" ? "=" : "<="} 1`,
  );
  const names = costs.map((_, n) => `x${n}`);
  const binaries: string[] = [];
  for (let n = 0; n < names.length; n += termsEachLine)
    binaries.push(` ${names.slice(n, n + termsEachLine).join(" ")}`);
  return [
    "Minimize",
    ` cost: ${sumText(costs.map((cost, n) => `${cost} x${n}`))}`,
    "Subject To",
    ...lines,
    "Binary",
    ...binaries,
    "End",
    "",
  ].join("\n");
}

/** Which place each visit got; null where it stays. @param chosen whether each column is chosen */
export function chosenPlaces(
  programme: CoverProgramme,
  visitCount: number,
  chosen: readonly boolean[],
): (CandidatePlace | null)[] {
  const places: (CandidatePlace | null)[] = Array.from({ length: visitCount }, () => null);
  for (const [n, column] of programme.columns.entries())
    if (chosen[n] && column.place) places[column.visit] = column.place;
  return places;
}
