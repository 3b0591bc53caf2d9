import { createHash, randomBytes } from "node:crypto";

/** How long a letter can be read by its link. */
export const linkDays = 30;

/** 256 random bits; only their hash is kept, so that a copy of the database opens no letter. */
export function newLetterToken(): string {
  return randomBytes(32).toString("base64url");
}

export function hashLetterToken(token: string): string {
  return createHash("sha256").update(token, "utf8").digest("hex");
}
