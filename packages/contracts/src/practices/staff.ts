import { roles } from "@withy/core/access/roles";
import { readHcpcNumber } from "@withy/core/identifiers/registration";
import { z } from "zod";
import { idField, requiredText } from "../fields";

export const roleHoldingField = z.strictObject({
  role: z.enum(roles, "Choose a role."),
  /** Null: at every site. */
  siteId: idField.nullable(),
});

const rolesField = z
  .array(roleHoldingField)
  .min(1, "Choose at least one role.")
  .max(20, "Choose fewer roles.");

export const listStaffInput = z.strictObject({});

export interface StaffRow {
  readonly id: string;
  readonly name: string;
  readonly jobTitle: string;
  readonly email: string | null;
  readonly isActive: boolean;
  readonly isTherapist: boolean;
  readonly roles: readonly { readonly role: (typeof roles)[number]; readonly siteId: string | null }[];
  /** Whether the person has set a password. */
  readonly hasJoined: boolean;
  readonly lastSeenAt: string | null;
}

export const inviteStaffMemberInput = z.strictObject({
  givenName: requiredText(60, "Enter the given name."),
  familyName: requiredText(60, "Enter the family name."),
  email: z
    .string("Enter the e-mail address.")
    .trim()
    .toLowerCase()
    .pipe(z.email("Enter an e-mail address in full, such as name@practice.example.").max(254)),
  jobTitle: requiredText(60, "Enter what the person works as, such as physiotherapist."),
  registrationNumber: z
    .string()
    .nullish()
    .transform((text, ctx) => {
      if (text == null || text.trim() === "") return null;
      const number = readHcpcNumber(text);
      if (number !== null) return number;
      ctx.addIssue({ code: "custom", message: "Enter the HCPC number, such as PH123456." });
      return z.NEVER;
    }),
  homeSiteId: idField,
  roles: rolesField,
});
export type InviteStaffMemberInput = z.input<typeof inviteStaffMemberInput>;

export const staffMemberIdInput = z.strictObject({ staffMemberId: idField });

export const changeRolesInput = z.strictObject({ staffMemberId: idField, roles: rolesField });
export type ChangeRolesInput = z.input<typeof changeRolesInput>;

/** Said after someone was deactivated: what they leave behind. */
export interface DeactivatedView {
  readonly staffMemberId: string;
  readonly endedSessions: number;
  /** Visits still booked with them, which need cover. */
  readonly upcomingVisits: number;
}
