import { letterIdInput } from "@withy/contracts/letters";
import { verb } from "../verb";
import { auditLetter } from "./letter-audit";
import { loadLetter } from "./letter-records";
import { type RenderedLetter, renderLetter } from "./printed-letter";

/** The letter as a PDF: a draft says that it is one. */
export const getLetterPdf = verb(
  "letters.read",
  letterIdInput,
  async (ctx, input): Promise<RenderedLetter> => {
    const at = await loadLetter(ctx, "letters.read", input.letterId);
    const file = await renderLetter(ctx, at.letter);
    await auditLetter(ctx, "printed", at, { state: at.letter.state });
    return file;
  },
);
