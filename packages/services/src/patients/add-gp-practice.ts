import { addGpPracticeInput, type GpPracticeView } from "@withy/contracts/patients";
import { normalisePostcode } from "@withy/core/identifiers/postcode";
import { newId } from "@withy/core/ids";
import { gpPractices } from "@withy/db/schema";
import { recordAudit } from "../audit/record-audit";
import { once } from "../once";
import { verb } from "../verb";
import { toGpPracticeView } from "./list-gp-practices";

/** Adds a surgery to the practice's address book. */
export const addGpPractice = verb(
  "patients.edit",
  addGpPracticeInput,
  (ctx, input): Promise<GpPracticeView> =>
    once(ctx, "gp-practice.add", async (tx) => {
      const row = {
        practiceId: tx.practiceId,
        id: newId(),
        ...input,
        postcode: normalisePostcode(input.postcode),
      };
      await tx.db.insert(gpPractices).values(row);
      await recordAudit(tx, { action: "gp-practice.added", subjectKind: "gp-practice", subjectId: row.id });
      return toGpPracticeView(row);
    }),
);
