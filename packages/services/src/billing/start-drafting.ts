import { type DraftingJobView, draftInvoicesInput } from "@withy/contracts/billing";
import { patients, sites } from "@withy/db/schema";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { startJob } from "../messaging/start-job";
import { once } from "../once";
import { requireReach } from "../reach";
import { verb } from "../verb";
import { draftingView, draftVisitsKind } from "./draft-visits-job";

/** Starts drafting every visit that waits, by the worker. Where the person's own drafting runs already, gives that one. */
export const startDrafting = verb("billing.draft", draftInvoicesInput, (ctx, wish) =>
  once(ctx, "billing.start-drafting", async (tx): Promise<DraftingJobView> => {
    if (wish.patientId !== undefined) await loadRecord(tx, patients, wish.patientId, "patient");
    if (wish.siteId !== undefined) {
      const site = await loadRecord(tx, sites, wish.siteId, "site");
      requireReach(tx, "billing.draft", site.id, "site");
    }
    const { patientId, siteId } = wish;
    const input = { ...(patientId && { patientId }), ...(siteId && { siteId }) };
    const { row, isNew } = await startJob(tx, {
      kind: draftVisitsKind,
      input,
      liveKey: draftingKey(tx, wish),
    });
    if (isNew) {
      const about = { patientId: patientId ?? null, siteId: siteId ?? null };
      await recordAudit(tx, { action: "drafting.started", subjectKind: "job", subjectId: row.id, ...about });
    }
    return draftingView(row);
  }),
);

/** One unfinished drafting for each person and wish. */
export const draftingKey = (
  ctx: Pick<Context, "staffMemberId">,
  wish: { patientId?: string | undefined; siteId?: string | undefined },
): string => [ctx.staffMemberId, wish.patientId ?? "-", wish.siteId ?? "-"].join(" ");
