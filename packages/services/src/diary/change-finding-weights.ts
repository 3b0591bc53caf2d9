import { changeFindingWeightsInput } from "@withy/contracts/diary";
import { stale } from "@withy/core/errors";
import { diarySettings, practices } from "@withy/db/schema";
import { rankConcerns, type Weights } from "@withy/diary/rank-time";
import { eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { readFindingWeights } from "./finding-weights";

const isSame = (a: Weights, b: Weights): boolean => rankConcerns.every((c) => a[c] === b[c]);

/** Sets how times are ranked, from the next search on. */
export const changeFindingWeights = verb(
  "practice.manage",
  changeFindingWeightsInput,
  (ctx, { weights, before }): Promise<Weights> =>
    inTransaction(ctx, async (tx) => {
      // The settings' row may not stand yet, so the practice's own row orders two owners.
      await tx.db
        .select({ id: practices.id })
        .from(practices)
        .where(eq(practices.id, tx.practiceId))
        .for("update");
      const current = await readFindingWeights(tx);
      if (!isSame(current, before)) throw stale("page", { current });
      await tx.db
        .insert(diarySettings)
        .values({ practiceId: tx.practiceId, findingWeights: weights })
        .onDuplicateKeyUpdate({ set: { findingWeights: weights } });
      await recordAudit(tx, {
        action: "practice.finding-weights-changed",
        subjectKind: "practice",
        subjectId: tx.practiceId,
        detail: { before: current, after: weights },
      });
      return weights;
    }),
);
