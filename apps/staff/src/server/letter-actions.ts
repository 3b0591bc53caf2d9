"use server";
import { isAppError } from "@withy/core/errors";
import { checkLetterReader } from "@withy/services/letters";
import { checkActionOrigin } from "./action-origin";
import { systemContext } from "./session";

export interface ReaderState {
  /** As typed. */
  bornOn: string;
  problem: string | null;
  isRight: boolean;
  /** Counts up, so that a second refusal takes the focus again. */
  attempt: number;
}

/** The question before a letter behind a private link; works before any script has loaded. */
export async function askReader(before: ReaderState, form: FormData): Promise<ReaderState> {
  const bornOn = String(form.get("bornOn") ?? "");
  const attempt = before.attempt + 1;
  try {
    await checkActionOrigin();
    await checkLetterReader(systemContext(), { token: String(form.get("token") ?? ""), bornOn });
    return { bornOn, problem: null, isRight: true, attempt };
  } catch (error) {
    if (!isAppError(error)) throw error;
    return { bornOn, problem: error.fields[0]?.message ?? error.message, isRight: false, attempt };
  }
}
