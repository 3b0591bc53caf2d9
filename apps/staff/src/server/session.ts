import "server-only";
import { systemClock } from "@withy/core/clock";
import { newId } from "@withy/core/ids";
import type { SystemContext } from "@withy/services/context";
import { readSession, type SessionView } from "@withy/services/practices";
import { decode, encode } from "next-auth/jwt";
import { database } from "./database";
import { env } from "./env";

/** next-auth's own cookie names, so that its routes and ours share one sign-in. */
export function sessionCookieName(): string {
  return env().NEXTAUTH_URL.startsWith("https://")
    ? "__Secure-next-auth.session-token"
    : "next-auth.session-token";
}

const tokenSeconds = 12 * 3600;

export function sealSession(sessionId: string, name: string): Promise<string> {
  return encode({ token: { sid: sessionId, name }, secret: env().WITHY_SECRET, maxAge: tokenSeconds });
}

export function sessionCookieOptions() {
  return {
    httpOnly: true,
    sameSite: "lax",
    path: "/",
    secure: env().NEXTAUTH_URL.startsWith("https://"),
    maxAge: tokenSeconds,
  } as const;
}

const opened = new Map<string, { sid: string; until: number }>();

/** The session id inside a cookie. Opening a seal is pure, so it is remembered; whether the session lives is not. */
async function openSeal(token: string): Promise<string | null> {
  const known = opened.get(token);
  if (known && known.until > Date.now()) return known.sid;
  const content = await decode({ token, secret: env().WITHY_SECRET }).catch(() => null);
  if (!content?.sid) return null;
  if (opened.size > 2000) opened.clear();
  opened.set(token, { sid: content.sid, until: (Number(content.exp) || 0) * 1000 });
  return content.sid;
}

export function systemContext(requestId: string = newId()): SystemContext {
  return { clock: systemClock, db: database().db, requestId };
}

/** The live session behind a cookie's value, or null. */
export async function sessionFor(
  token: string | undefined,
  requestId?: string,
  idempotencyKey?: string | null,
): Promise<SessionView | null> {
  if (!token) return null;
  const sid = await openSeal(token);
  return sid === null ? null : readSession(systemContext(requestId), sid, idempotencyKey ?? null);
}
