"use server";
import type { AccountLinkPurpose } from "@withy/contracts/practices";
import { isAppError } from "@withy/core/errors";
import { requestPasswordReset, setPasswordByLink } from "@withy/services/practices";
import { redirect } from "next/navigation";
import { checkActionOrigin } from "./action-origin";
import { addressOf, resetLimits } from "./auth";
import { systemContext } from "./session";

export interface ForgotState {
  email: string;
  problem: string | null;
}

/** The form for a forgotten password; works before any script has loaded. */
export async function forget(_: ForgotState, form: FormData): Promise<ForgotState> {
  const email = String(form.get("email") ?? "");
  try {
    const sent = await checkActionOrigin();
    await requestPasswordReset(systemContext(), resetLimits(), { email, address: addressOf(sent) });
  } catch (error) {
    if (!isAppError(error)) throw error;
    return { email, problem: error.fields[0]?.message ?? error.message };
  }
  redirect("/forgot?sent=1");
}

export interface PasswordState {
  problem: string | null;
  /** The link itself no longer works: another password would not help. */
  isLinkEnded: boolean;
}

/** The form behind a link from an e-mail, for a forgotten password or a new account. */
export async function choosePassword(_: PasswordState, form: FormData): Promise<PasswordState> {
  const purpose: AccountLinkPurpose = form.get("purpose") === "invitation" ? "invitation" : "reset";
  const password = String(form.get("password") ?? "");
  try {
    await checkActionOrigin();
    if (password !== String(form.get("again") ?? ""))
      return { problem: "The two passwords differ. Type both again.", isLinkEnded: false };
    await setPasswordByLink(systemContext(), { token: String(form.get("token") ?? ""), purpose, password });
  } catch (error) {
    if (!isAppError(error)) throw error;
    return {
      problem: error.fields[0]?.message ?? error.message,
      isLinkEnded: error.kind === "link-ended",
    };
  }
  redirect(`/sign-in?ready=${purpose}`);
}
