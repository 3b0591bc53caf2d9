/** How much a practice holds. The days are as full in both, so that one day's page is the same size. */
export interface VolumePlan {
  readonly database: string;
  readonly sites: number;
  readonly therapists: number;
  readonly patients: number;
  readonly appointments: number;
}

const house = { sites: 12, therapists: 150 };

export const large: VolumePlan = {
  ...house,
  database: "withy_large",
  patients: 200_000,
  appointments: 1_000_000,
};
export const small: VolumePlan = { ...house, database: "withy_small", patients: 2_000, appointments: 10_000 };

export const visitsADay = 9;
/** Weeks to come that are as full as the past. */
export const weeksAhead = 8;
/** Visits start every so many minutes from eight in the morning, and last thirty. */
export const stepMinutes = 45;

/** What a row is, inside its id. */
const tags = {
  practice: 1,
  site: 2,
  room: 3,
  member: 4,
  service: 5,
  patient: 6,
  appointment: 7,
  pattern: 8,
  role: 9,
  session: 10,
} as const;
export type Tag = keyof typeof tags;

const epoch = 1_700_000_000_000;
const pad = (value: number, digits: number) => value.toString(16).padStart(digits, "0");

/** The id of the n-th row of its kind: a UUID of version 7 that rises with n. */
export function volumeId(tag: Tag, n: number): string {
  const time = pad(epoch + n, 12);
  return `${time.slice(0, 8)}-${time.slice(8)}-7${pad(tags[tag], 3)}-8000-${pad(n, 12)}`;
}

/** The same in SQL, where `n` is an expression. */
export function volumeIdSql(tag: Tag, n: string): string {
  const time = `LPAD(LOWER(HEX(${epoch} + ${n})), 12, '0')`;
  return `CONCAT(LEFT(${time}, 8), '-', RIGHT(${time}, 4), '-7${pad(tags[tag], 3)}-8000-', LPAD(LOWER(HEX(${n})), 12, '0'))`;
}
