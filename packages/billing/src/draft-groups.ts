/** The most visits that one request drafts; where more wait, drafting is a job with progress. */
export const mostVisitsAtOnce = 100;

/** What decides on which draft a visit goes. */
export interface DraftGroupKey {
  readonly patientId: string;
  readonly payerId: string | null;
  readonly siteId: string;
}

/** The draft that a visit goes on: one for each patient, payer and site. */
export const draftKey = ({ patientId, payerId, siteId }: DraftGroupKey): string =>
  `${patientId} ${payerId ?? "self"} ${siteId}`;

/** Visits by the draft that they go on, groups and visits in the order in which they come. Every visit is in one group. */
export function groupByDraft<V extends DraftGroupKey>(visits: readonly V[]): V[][] {
  const groups = new Map<string, V[]>();
  for (const visit of visits) {
    const key = draftKey(visit);
    const group = groups.get(key);
    if (group) group.push(visit);
    else groups.set(key, [visit]);
  }
  return [...groups.values()];
}
