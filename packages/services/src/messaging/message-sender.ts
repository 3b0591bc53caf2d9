import { formatPhone } from "@withy/core/identifiers/phone";
import { practices } from "@withy/db/schema";
import type { EmailSender } from "@withy/documents/message/email";
import { eq } from "drizzle-orm";
import type { SystemContext } from "../context";

export interface PracticeSender extends EmailSender {
  readonly email: string;
}

/** The practice as it signs its messages. */
export async function loadSender(ctx: SystemContext, practiceId: string): Promise<PracticeSender> {
  const [practice] = await ctx.db.select().from(practices).where(eq(practices.id, practiceId)).limit(1);
  if (!practice) throw new Error("An outbox row names a practice that does not exist");
  const address = [...practice.addressLines, practice.postcode].join(", ");
  return {
    practice: practice.name,
    email: practice.email,
    contactLines: [address, formatPhone(practice.phone)],
  };
}
