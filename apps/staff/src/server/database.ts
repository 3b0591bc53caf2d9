import "server-only";
import { type Connection, connect } from "@withy/services/database";
import { env } from "./env";

const held = globalThis as typeof globalThis & { withyConnection?: Connection };

/** The one pool of this process; kept on globalThis so that a reload in development does not open another. */
export function database(): Connection {
  held.withyConnection ??= connect(env().DATABASE_URL);
  return held.withyConnection;
}
