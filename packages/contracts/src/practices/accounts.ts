import { z } from "zod";
import { idField } from "../fields";

const typedPassword = (empty: string) =>
  z.string(empty).min(1, empty).max(400, "Use at most 200 characters.");

export const requestPasswordResetInput = z.strictObject({
  email: z
    .string("Enter your e-mail address.")
    .trim()
    .toLowerCase()
    .min(1, "Enter your e-mail address.")
    .max(254, "Use 254 characters or fewer."),
});

/** As long as the 256 bits of a token are in base64url. */
export const accountTokenField = z.string().regex(/^[\w-]{43}$/, "This link is not complete.");

export const accountLinkPurposes = ["reset", "invitation"] as const;
export type AccountLinkPurpose = (typeof accountLinkPurposes)[number];

export const openAccountLinkInput = z.strictObject({
  token: accountTokenField,
  purpose: z.enum(accountLinkPurposes),
});

/** Who a link was sent to, shown above the new password. */
export interface AccountLinkView {
  readonly name: string;
  readonly email: string;
  readonly practiceName: string;
}

export const setPasswordByLinkInput = z.strictObject({
  token: accountTokenField,
  purpose: z.enum(accountLinkPurposes),
  password: typedPassword("Enter a new password."),
});

export const changePasswordInput = z.strictObject({
  currentPassword: typedPassword("Enter the password you sign in with now."),
  password: typedPassword("Enter a new password."),
});

export const listMySessionsInput = z.strictObject({});
export const endSessionInput = z.strictObject({ sessionId: idField });

export interface SessionRow {
  readonly id: string;
  readonly openedAt: string;
  readonly lastSeenAt: string;
  /** Browser and system in a few words: "Firefox on Windows". */
  readonly browser: string;
  readonly deskSiteName: string;
  readonly isThisOne: boolean;
}
