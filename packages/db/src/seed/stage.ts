import type {
  episodes,
  gpPractices,
  patients,
  payers,
  practices,
  prices,
  products,
  rooms,
  services,
  sites,
  staffMembers,
} from "../schema";
import type { Random } from "./random";
import type { PersonPlan, PracticePlan, SitePlan } from "./scenario/practice-plan";
import type { SeedRows } from "./seed-rows";

/** What every part of the seed is given: the dice, the day, and where rows go. */
export interface Stage {
  readonly random: Random;
  readonly newId: () => string;
  readonly rows: SeedRows;
  /** The moment of seeding; what lies before it has happened. */
  readonly now: Date;
  /** The site's day at that moment. */
  readonly today: string;
  readonly zone: string;
}

export type SiteRow = typeof sites.$inferInsert & {
  plan: SitePlan;
  treatmentRooms: RoomRow[];
  gymRooms: RoomRow[];
};
export type RoomRow = typeof rooms.$inferInsert;
export type PersonRow = typeof staffMembers.$inferInsert & { plan: PersonPlan };
export type ServiceRow = typeof services.$inferInsert;
export type PatientRow = typeof patients.$inferInsert;
export type EpisodeRow = typeof episodes.$inferInsert;

/** A practice whose people, places and prices stand. */
export interface House {
  readonly practice: typeof practices.$inferInsert;
  readonly practiceId: string;
  readonly plan: PracticePlan;
  readonly sites: ReadonlyMap<string, SiteRow>;
  readonly people: readonly PersonRow[];
  readonly therapists: readonly PersonRow[];
  readonly desk: readonly PersonRow[];
  readonly services: Readonly<Record<string, ServiceRow>>;
  readonly products: readonly (typeof products.$inferInsert)[];
  readonly prices: readonly (typeof prices.$inferInsert)[];
  readonly payers: readonly (typeof payers.$inferInsert)[];
  readonly surgeries: readonly { row: typeof gpPractices.$inferInsert; doctors: readonly string[] }[];
}

export function siteOf(house: House, key: string): SiteRow {
  const site = house.sites.get(key);
  if (!site) throw new RangeError(`The scenario has no site ${key}.`);
  return site;
}

export function serviceOf(house: House, key: string): ServiceRow {
  const service = house.services[key];
  if (!service) throw new RangeError(`The scenario has no service ${key}.`);
  return service;
}

/** The instant, or the moment of seeding where it would lie in the future. */
export function notAfterNow(stage: Pick<Stage, "now">, at: Date): Date {
  return new Date(Math.min(at.getTime(), stage.now.getTime()));
}
