import { foreignKey, index, int, json, mysqlTable, primaryKey } from "drizzle-orm/mysql-core";
import { clockTime, plainDate, tenantKey, uuid } from "../../columns";
import { sites } from "../practices/sites";
import { staffMembers } from "../practices/staff-members";

export interface PatternBreak {
  startsAt: string;
  endsAt: string;
  label: string;
}

/** When a therapist works at a site: one weekday's hours, between two dates, every n weeks. Wall-clock times. */
export const workingPatterns = mysqlTable(
  "working_patterns",
  {
    ...tenantKey(),
    staffMemberId: uuid("staff_member_id").notNull(),
    siteId: uuid("site_id").notNull(),
    weekday: int("weekday").notNull(),
    startsAt: clockTime("starts_at").notNull(),
    endsAt: clockTime("ends_at").notNull(),
    breaks: json("breaks").$type<PatternBreak[]>().notNull(),
    validFrom: plainDate("valid_from").notNull(),
    validUntil: plainDate("valid_until"),
    /** 1: every week; 2: alternate weeks counted from the week of valid_from. */
    everyWeeks: int("every_weeks").notNull().default(1),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({
      name: "working_patterns_member",
      columns: [t.practiceId, t.staffMemberId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    foreignKey({
      name: "working_patterns_site",
      columns: [t.practiceId, t.siteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
    index("working_patterns_by_member").on(t.practiceId, t.staffMemberId, t.weekday),
    index("working_patterns_by_site").on(t.practiceId, t.siteId, t.weekday),
  ],
);
