import { createHash, randomBytes } from "node:crypto";
import { newId } from "@withy/core/ids";
import {
  accountTokens,
  invoiceCounters,
  practices,
  siteHours,
  sites,
  staffAccounts,
  staffMembers,
  staffRoles,
} from "@withy/db/schema";
import { z } from "zod";
import { recordAudit } from "../audit/record-audit";
import type { SystemContext } from "../context";
import { inTransaction } from "../transaction";
import { parse } from "../verb";

const name = z.string().trim().min(1).max(80);

export const foundPracticeInput = z.strictObject({
  practiceName: name,
  siteName: name,
  ownerGivenName: name.max(60),
  ownerFamilyName: name.max(60),
  ownerEmail: z.email().toLowerCase(),
  invoicePrefix: z.string().regex(/^[A-Z]{2,6}$/, "Use two to six capital letters."),
});

const invitationDays = 7;

/**
 * Lays down a new practice with one site and its owner, who sets a password by the returned token. Run from the
 * command line by whoever looks after the installation; no signed-in person can do it.
 */
export async function foundPractice(
  system: SystemContext,
  raw: z.input<typeof foundPracticeInput>,
): Promise<{ token: string }> {
  const input = parse(foundPracticeInput, raw);
  const token = randomBytes(32).toString("base64url");
  await inTransaction(system, async (tx) => {
    const now = tx.clock.now();
    const [practiceId, siteId, staffMemberId] = [newId(), newId(), newId()];
    await tx.db.insert(practices).values({
      id: practiceId,
      name: input.practiceName,
      legalName: input.practiceName,
      addressLines: [],
      postcode: "",
      phone: "",
      email: input.ownerEmail,
      invoicePrefix: input.invoicePrefix,
      createdAt: now,
    });
    await tx.db.insert(sites).values({
      practiceId,
      id: siteId,
      name: input.siteName,
      addressLines: [],
      postcode: "",
      phone: "",
      createdAt: now,
    });
    await tx.db.insert(siteHours).values(
      [1, 2, 3, 4, 5].map((weekday) => ({
        practiceId,
        siteId,
        weekday,
        opensAt: "08:00",
        closesAt: "18:00",
      })),
    );
    await tx.db.insert(staffMembers).values({
      practiceId,
      id: staffMemberId,
      givenName: input.ownerGivenName,
      familyName: input.ownerFamilyName,
      jobTitle: "owner",
      homeSiteId: siteId,
      createdAt: now,
    });
    await tx.db
      .insert(staffRoles)
      .values({ practiceId, id: newId(), staffMemberId, siteId: null, role: "owner" });
    await tx.db
      .insert(staffAccounts)
      .values({ id: newId(), practiceId, staffMemberId, email: input.ownerEmail });
    await tx.db.insert(invoiceCounters).values({ practiceId, series: "invoice", nextNumber: 1 });
    await tx.db.insert(accountTokens).values({
      id: newId(),
      practiceId,
      staffMemberId,
      purpose: "invitation",
      tokenHash: createHash("sha256").update(token).digest("hex"),
      createdAt: now,
      expiresAt: new Date(now.getTime() + invitationDays * 86_400_000),
    });
    await recordAudit(
      { ...tx, practiceId, staffMemberId: null },
      { action: "practice.founded", subjectKind: "practice", subjectId: practiceId },
    );
  });
  return { token };
}
