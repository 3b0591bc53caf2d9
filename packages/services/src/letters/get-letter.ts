import { type LetterView, letterIdInput } from "@withy/contracts/letters";
import { verb } from "../verb";
import { auditLetter } from "./letter-audit";
import { loadLetter } from "./letter-records";
import { letterView } from "./letter-view";

export const getLetter = verb("letters.read", letterIdInput, async (ctx, input): Promise<LetterView> => {
  const at = await loadLetter(ctx, "letters.read", input.letterId);
  const view = await letterView(ctx, at);
  await auditLetter(ctx, "read", at);
  return view;
});
