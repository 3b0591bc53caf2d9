import { chooseDeskSiteInput } from "@withy/contracts/practices";
import { sessions, sites } from "@withy/db/schema";
import { eq } from "drizzle-orm";
import { recordAudit } from "../audit/record-audit";
import { loadRecord } from "../load-record";
import { inTransaction } from "../transaction";
import { verb } from "../verb";

/** Moves this browser's desk to another site of the practice. It changes where screens start, never what is allowed. */
export const chooseDeskSite = verb("account.own", chooseDeskSiteInput, (ctx, { siteId }) =>
  inTransaction(ctx, async (tx) => {
    const site = await loadRecord(tx, sites, siteId, "site");
    await tx.db.update(sessions).set({ deskSiteId: site.id }).where(eq(sessions.id, ctx.sessionId));
    await recordAudit(tx, {
      action: "session.desk-changed",
      subjectKind: "session",
      subjectId: ctx.sessionId,
      siteId: site.id,
    });
    return { siteId: site.id };
  }),
);
