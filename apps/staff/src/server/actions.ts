"use server";
import { isAppError } from "@withy/core/errors";
import { chooseDeskSite, signIn, signOut } from "@withy/services/practices";
import { revalidatePath } from "next/cache";
import { cookies } from "next/headers";
import { redirect } from "next/navigation";
import { checkActionOrigin } from "./action-origin";
import { addressOf, signInLimits } from "./auth";
import { requireSession } from "./context";
import { sealSession, sessionCookieName, sessionCookieOptions, systemContext } from "./session";

export interface SignInState {
  email: string;
  problem: string | null;
}

/** The sign-in form; works before any script has loaded. */
export async function enter(_: SignInState, form: FormData): Promise<SignInState> {
  const email = String(form.get("email") ?? "");
  try {
    const sent = await checkActionOrigin();
    const opened = await signIn(systemContext(), signInLimits(), {
      email,
      password: String(form.get("password") ?? ""),
      address: addressOf(sent),
      userAgent: sent.get("user-agent") ?? "",
    });
    (await cookies()).set(
      sessionCookieName(),
      await sealSession(opened.sessionId, opened.name),
      sessionCookieOptions(),
    );
  } catch (error) {
    if (!isAppError(error)) throw error;
    return { email, problem: error.message };
  }
  redirect(safePath(form.get("from")));
}

function safePath(value: FormDataEntryValue | null): string {
  const path = String(value ?? "");
  return /^\/(?![/\\])[\w\-/?=&.%]*$/.test(path) ? path : "/";
}

export async function leave(): Promise<void> {
  await checkActionOrigin();
  const { context } = await requireSession();
  await signOut(context, {});
  (await cookies()).delete(sessionCookieName());
  redirect("/sign-in?left=1");
}

/** Moves this browser to another site's desk. */
export async function chooseDesk(siteId: string): Promise<void> {
  await checkActionOrigin();
  const { context } = await requireSession();
  await chooseDeskSite(context, { siteId });
  revalidatePath("/", "layout");
}
