import { auditEvents, outboxMessages } from "@withy/db/schema";
import { and, asc, eq } from "drizzle-orm";
import type { TestPractice } from "./practice";

/** What was recorded about one row, oldest first. */
export function auditOf(practice: TestPractice, subjectId: string) {
  return practice.db
    .select()
    .from(auditEvents)
    .where(and(eq(auditEvents.practiceId, practice.practiceId), eq(auditEvents.subjectId, subjectId)))
    .orderBy(asc(auditEvents.at), asc(auditEvents.id));
}

/** The messages that wait, or went out, about one row. */
export function messagesAbout(practice: TestPractice, aboutId: string) {
  return practice.db
    .select()
    .from(outboxMessages)
    .where(and(eq(outboxMessages.practiceId, practice.practiceId), eq(outboxMessages.aboutId, aboutId)))
    .orderBy(asc(outboxMessages.createdAt), asc(outboxMessages.id));
}
