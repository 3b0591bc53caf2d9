import { z } from "zod";
import { idField, pageFields } from "./fields";
import type { MessageState, MessageTemplate } from "./message-words";

export * from "./message-words";

/** A path of our own app; the worker puts the app's address before it. It carries a secret: cleared once sent. */
const secretPath = z.string().regex(/^\/[A-Za-z0-9/_-]+(\?[A-Za-z0-9=&_-]+)?$/);

export const accountMessagePayload = z.strictObject({
  greetingName: z.string(),
  path: secretPath,
  /** In words: "one hour". */
  validFor: z.string(),
  /** The colleague who invited, by name; only with "staff-invitation". */
  invitedBy: z.string().nullable(),
});
export type AccountMessagePayload = z.infer<typeof accountMessagePayload>;

export const letterMessagePayload = z.strictObject({
  deliveryId: z.uuid(),
  recipientName: z.string(),
  reference: z.string(),
  path: secretPath,
  validFor: z.string(),
});
export type LetterMessagePayload = z.infer<typeof letterMessagePayload>;

/** What an offer of a time, or the note that it has gone, says. Never what the visit is for. */
export const offerMessagePayload = z.strictObject({
  offerId: z.uuid(),
  startsAt: z.iso.datetime(),
  endsAt: z.iso.datetime(),
  expiresAt: z.iso.datetime(),
  zone: z.string(),
  /** Site and address in one line. */
  place: z.string(),
  phone: z.string(),
  withWhom: z.string(),
  greetingName: z.string(),
  /** The private page; null with "offer-gone". */
  path: secretPath.nullable(),
});
export type OfferMessagePayload = z.infer<typeof offerMessagePayload>;

export const listMessagesInput = z.strictObject({
  state: z.enum(["all", "waiting", "sent", "failed"]).default("all"),
  patientId: idField.optional(),
  ...pageFields,
});
export type ListMessagesInput = z.input<typeof listMessagesInput>;

export const sendMessageAgainInput = z.strictObject({ messageId: idField });

export interface MessageRow {
  readonly id: string;
  readonly template: MessageTemplate;
  readonly toAddress: string;
  readonly patientId: string | null;
  readonly patientName: string | null;
  readonly state: MessageState;
  readonly createdAt: string;
  readonly sentAt: string | null;
  /** When it is tried next; only while it waits. */
  readonly dueAt: string | null;
  readonly attempts: number;
  /** Why it did not go, and what to do, in words. */
  readonly problem: string | null;
  readonly canSendAgain: boolean;
}

/** Counts for the head of the list. */
export interface MessageCounts {
  readonly waiting: number;
  readonly failed: number;
}

const problems: readonly [RegExp, string][] = [
  [/^smtp-55[0-9]$|^bad-address$/, "The address was refused. Check it with the person, then send again."],
  [/^smtp-4|^smtp-5/, "The mail server would not take it for now."],
  [/^superseded$/, "Something newer was sent in its place."],
  [/^fault$/, "The message could not be put together. Tell whoever runs Withy for you."],
  [/.*/, "The mail server could not be reached."],
];

/** A stored reason, such as "smtp-550", as a sentence. */
export function messageProblem(reason: string): string {
  return problems.find(([pattern]) => pattern.test(reason))?.[1] ?? "";
}
