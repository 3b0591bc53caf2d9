import { boolean, foreignKey, int, json, mysqlTable, primaryKey } from "drizzle-orm/mysql-core";
import { pence, uuid } from "../../columns";
import { practices } from "./practices";
import { sites } from "./sites";

/** How a practice runs its diary. No row: the defaults, which the code that reads it names. */
export const diarySettings = mysqlTable(
  "diary_settings",
  {
    practiceId: uuid("practice_id").primaryKey(),
    /** Weights of wish, wait, continuity and the rest of the day when times are ranked. */
    findingWeights: json("finding_weights").$type<Record<"wish" | "wait" | "knows" | "day", number>>(),
    /** Hours before a visit at which a reminder goes out. */
    reminderHours: json("reminder_hours").$type<number[]>(),
    /** Whether a therapist's feed may carry the patient's name; else initials only. */
    hasNamesInFeed: boolean("has_names_in_feed").notNull().default(false),
    lateCancellationFeePence: pence("late_cancellation_fee_pence").notNull().default(0),
    noShowFeePence: pence("no_show_fee_pence").notNull().default(0),
    /** How many people a freed time is offered to at once, and for how long. */
    offerCount: int("offer_count").notNull().default(3),
    offerMinutes: int("offer_minutes").notNull().default(120),
    version: int("version").notNull().default(1),
  },
  (t) => [
    foreignKey({ name: "diary_settings_practice", columns: [t.practiceId], foreignColumns: [practices.id] }),
  ],
);

/** The way between two sites, in minutes, for a therapist who works at both on one day. Both directions are rows. */
export const siteTravel = mysqlTable(
  "site_travel",
  {
    practiceId: uuid("practice_id").notNull(),
    fromSiteId: uuid("from_site_id").notNull(),
    toSiteId: uuid("to_site_id").notNull(),
    minutes: int("minutes").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.fromSiteId, t.toSiteId] }),
    foreignKey({
      name: "site_travel_from",
      columns: [t.practiceId, t.fromSiteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
    foreignKey({
      name: "site_travel_to",
      columns: [t.practiceId, t.toSiteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
  ],
);
