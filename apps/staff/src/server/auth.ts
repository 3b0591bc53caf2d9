import "server-only";
import { isAppError } from "@withy/core/errors";
import {
  createResetLimits,
  createSignInLimits,
  type ResetLimits,
  readSession,
  type SignInLimits,
  signIn,
} from "@withy/services/practices";
import type { AuthOptions } from "next-auth";
import Credentials from "next-auth/providers/credentials";
import { database } from "./database";
import { env } from "./env";
import { log } from "./log";
import { systemContext } from "./session";

let limits: SignInLimits | undefined;

export function signInLimits(): SignInLimits {
  limits ??= createSignInLimits(database(), new URL(env().DATABASE_URL).pathname.slice(1));
  return limits;
}

let forgotten: ResetLimits | undefined;

export function resetLimits(): ResetLimits {
  forgotten ??= createResetLimits(database(), new URL(env().DATABASE_URL).pathname.slice(1));
  return forgotten;
}

/** The browser's address as the nearest proxy saw it; on one machine there is none and all share one. */
export function addressOf(headers: { get(name: string): string | null }): string {
  return headers.get("x-forwarded-for")?.split(",").at(-1)?.trim() ?? "local";
}

/** next-auth keeps the sealed cookie; whether its session lives is our own table's to say. */
export function authOptions(): AuthOptions {
  return {
    secret: env().WITHY_SECRET,
    session: { strategy: "jwt", maxAge: 12 * 3600 },
    pages: { signIn: "/sign-in" },
    providers: [
      Credentials({
        name: "Withy",
        credentials: { email: {}, password: {} },
        async authorize(credentials, request) {
          const headers = new Headers((request.headers ?? {}) as Record<string, string>);
          try {
            const opened = await signIn(systemContext(), signInLimits(), {
              email: credentials?.email ?? "",
              password: credentials?.password ?? "",
              address: addressOf(headers),
              userAgent: headers.get("user-agent") ?? "",
            });
            return { id: opened.staffMemberId, name: opened.name, sid: opened.sessionId };
          } catch (error) {
            if (isAppError(error)) throw new Error(error.kind);
            throw error;
          }
        },
      }),
    ],
    callbacks: {
      async jwt({ token, user }) {
        if (user) return { ...token, sid: user.sid };
        const live = token.sid ? await readSession(systemContext(), token.sid) : null;
        if (!live) throw new Error("ended");
        return token;
      },
      session({ session, token }) {
        return { ...session, sid: token.sid ?? "" };
      },
    },
    logger: {
      error: (code) => {
        if (code !== "JWT_SESSION_ERROR") log.warn({ code }, "sign-in library");
      },
    },
  };
}
