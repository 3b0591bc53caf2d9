import "server-only";
import { can } from "@withy/core/access/can";
import type { Permission } from "@withy/core/access/permissions";
import { isAppError } from "@withy/core/errors";
import type { Context } from "@withy/services/context";
import type { SessionView } from "@withy/services/practices";
import { cookies } from "next/headers";
import { notFound, redirect } from "next/navigation";
import { cache } from "react";
import { sessionCookieName, sessionFor } from "./session";

/** The session of the page being rendered; read once a request. */
export const currentSession = cache(async (): Promise<SessionView | null> => {
  const jar = await cookies();
  return sessionFor(jar.get(sessionCookieName())?.value);
});

/** The session of a signed-in page. Sends whoever has none to the sign-in page. */
export async function requireSession(): Promise<SessionView> {
  const session = await currentSession();
  if (!session) redirect("/sign-in");
  return session;
}

/**
 * The context of a signed-in page that needs this permission somewhere; without it the page does not exist for
 * this person.
 */
export async function requireContext(permission: Permission): Promise<Context> {
  const { context } = await requireSession();
  if (!can(context.roles, permission)) notFound();
  return context;
}

/** Runs a read for a page: a row that is not there is the not-found page. */
export async function orNotFound<T>(read: Promise<T>): Promise<T> {
  try {
    return await read;
  } catch (error) {
    if (
      isAppError(error) &&
      (error.code === "not-found" || error.code === "forbidden" || error.code === "invalid")
    )
      notFound();
    throw error;
  }
}
