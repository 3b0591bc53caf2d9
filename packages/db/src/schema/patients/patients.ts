import { foreignKey, index, int, json, mysqlTable, primaryKey, varchar } from "drizzle-orm/mysql-core";
import { instant, plainDate, tenantKey, uuid } from "../../columns";
import { practices } from "../practices/practices";
import { sites } from "../practices/sites";
import { staffMembers } from "../practices/staff-members";
import { gpPractices } from "./gp-practices";

/** A person treated by the practice. */
export const patients = mysqlTable(
  "patients",
  {
    ...tenantKey(),
    givenName: varchar("given_name", { length: 80 }).notNull(),
    familyName: varchar("family_name", { length: 80 }).notNull(),
    preferredName: varchar("preferred_name", { length: 80 }),
    bornOn: plainDate("born_on").notNull(),
    /** Asked only because some published norms are split by it. */
    sex: varchar("sex", { length: 10 }).$type<"female" | "male" | "other">(),
    /** E.164. */
    phone: varchar("phone", { length: 20 }),
    email: varchar("email", { length: 254 }),
    addressLines: json("address_lines").$type<string[]>().notNull(),
    postcode: varchar("postcode", { length: 10 }),
    nhsNumber: varchar("nhs_number", { length: 10 }),
    gpPracticeId: uuid("gp_practice_id"),
    gpName: varchar("gp_name", { length: 120 }),
    /** What a caller or a letter writer must know: hearing, sight, language, a carer. Not clinical. */
    communicationNeeds: varchar("communication_needs", { length: 300 }),
    preferredChannel: varchar("preferred_channel", { length: 10 })
      .$type<"email" | "text" | "phone" | "post">()
      .notNull()
      .default("email"),
    nextOfKin: varchar("next_of_kin", { length: 160 }),
    homeSiteId: uuid("home_site_id").notNull(),
    /** Continuity: whom the patient last saw or asks for. */
    usualTherapistId: uuid("usual_therapist_id"),
    /** Folded names for prefix search in either order. */
    nameLastFirst: varchar("name_last_first", { length: 170 }).notNull(),
    nameFirstLast: varchar("name_first_last", { length: 170 }).notNull(),
    /** Digits from the end, so that the last six find the row. */
    phoneReversed: varchar("phone_reversed", { length: 20 }),
    version: int("version").notNull().default(1),
    createdAt: instant("created_at").notNull(),
    updatedAt: instant("updated_at").notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.practiceId, t.id] }),
    foreignKey({ name: "patients_practice", columns: [t.practiceId], foreignColumns: [practices.id] }),
    foreignKey({
      name: "patients_site",
      columns: [t.practiceId, t.homeSiteId],
      foreignColumns: [sites.practiceId, sites.id],
    }),
    foreignKey({
      name: "patients_gp",
      columns: [t.practiceId, t.gpPracticeId],
      foreignColumns: [gpPractices.practiceId, gpPractices.id],
    }),
    foreignKey({
      name: "patients_therapist",
      columns: [t.practiceId, t.usualTherapistId],
      foreignColumns: [staffMembers.practiceId, staffMembers.id],
    }),
    // The five ways in which the head's search finds a person, each a prefix inside the practice.
    index("patients_last_first").on(t.practiceId, t.nameLastFirst),
    index("patients_first_last").on(t.practiceId, t.nameFirstLast),
    index("patients_phone").on(t.practiceId, t.phoneReversed),
    index("patients_born").on(t.practiceId, t.bornOn, t.nameLastFirst),
    index("patients_nhs").on(t.practiceId, t.nhsNumber),
  ],
);
