import { editWaitingEntryInput } from "@withy/contracts/diary";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { auditEntry, checkedFields, saveEntry, takeEntry } from "./waiting-entry";

/** Changes what someone waits for; since when they wait stays. An offer that is open stays open. */
export const editWaitingEntry = verb(
  "diary.book",
  editWaitingEntryInput,
  async (ctx, { entryId, version, ...input }): Promise<{ entryId: string }> =>
    inTransaction(ctx, async (tx) => {
      const before = await takeEntry(tx, { entryId, version });
      const fields = await checkedFields(tx, before.patientId, input);
      await saveEntry(tx, before, fields);
      await auditEntry(tx, before, "edited", { urgency: fields.urgency });
      return { entryId };
    }),
);
