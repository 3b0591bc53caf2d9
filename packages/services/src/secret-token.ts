import { createHash, randomBytes } from "node:crypto";

/** 256 random bits as 43 characters that an address or a header can carry. */
export function newSecretToken(): string {
  return randomBytes(32).toString("base64url");
}

/** What is kept of a secret, so that a copy of the database opens nothing. */
export function hashSecretToken(token: string): Buffer {
  return createHash("sha256").update(token, "utf8").digest();
}
