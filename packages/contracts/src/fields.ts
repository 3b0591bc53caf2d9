import { isPlainDate } from "@withy/core/plain-date";
import { z } from "zod";

/** Fields that many inputs share. The messages stand beside the field, so they say what to do. */
export const idField = z.uuid("This link is not complete. Go back and try again.");

export const plainDateField = z.string().refine(isPlainDate, "Enter a real date.");

export const clockTimeField = z.string().regex(/^([01]\d|2[0-3]):[0-5]\d$/, "Enter a time such as 09:30.");

/** An instant as ISO 8601 in UTC, as JSON carries it; a Date once parsed. */
export const instantField = z.iso
  .datetime({ offset: true, error: "Enter a date and time." })
  .transform((text) => new Date(text));

/** The row's version as the screen saw it; a save with an old one answers "stale". */
export const versionField = z.int().positive();

export const penceField = z
  .int("Enter an amount of money, such as 62.00.")
  .min(0, "Enter an amount of 0 or more.");

/** Text that may be left empty: trimmed, and null when nothing is left. */
export const optionalText = (max: number, label: string) =>
  z
    .string()
    .trim()
    .max(max, `${label} must be ${max} characters or fewer.`)
    .transform((text) => (text === "" ? null : text))
    .nullish()
    .transform((text) => text ?? null);

export const requiredText = (max: number, empty: string) =>
  z.string(empty).trim().min(1, empty).max(max, `Use ${max} characters or fewer.`);

/** Page number and size as a query string carries them. */
export const pageFields = {
  page: z.coerce.number().int().min(1).default(1),
  pageSize: z.coerce.number().int().min(1).max(100).default(25),
};
