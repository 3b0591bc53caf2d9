import { boolean, foreignKey, index, int, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { instant, tenantKey, uuid } from "../../columns";
import { practices } from "./practices";
import { sites } from "./sites";

/** A person who works at the practice. Rows stay when people leave: their names stand under notes. */
export const staffMembers = mysqlTable(
  "staff_members",
  {
    ...tenantKey(),
    givenName: varchar("given_name", { length: 60 }).notNull(),
    familyName: varchar("family_name", { length: 60 }).notNull(),
    /** What the person is called in the head and under letters, for example "physiotherapist". */
    jobTitle: varchar("job_title", { length: 60 }).notNull(),
    /** HCPC number, printed under signed notes and letters. */
    registrationNumber: varchar("registration_number", { length: 10 }),
    isTherapist: boolean("is_therapist").notNull().default(false),
    isActive: boolean("is_active").notNull().default(true),
    homeSiteId: uuid("home_site_id").notNull(),
    position: int("position").notNull().default(0),
    createdAt: instant("created_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({ name: "staff_members_practice", columns: [t.practiceId], foreignColumns: [practices.id] }),
    foreignKey({
      name: "staff_members_site",
      columns: [t.practiceId, t.homeSiteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
    // The diary's columns and every list of therapists.
    index("staff_members_therapists").on(t.practiceId, t.isTherapist, t.position),
  ],
);
