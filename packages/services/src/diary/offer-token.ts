import { createHash, randomBytes } from "node:crypto";

/** 256 random bits; only their hash is kept, so that a copy of the database accepts nothing. */
export const newOfferToken = (): string => randomBytes(32).toString("base64url");

export const hashOfferToken = (token: string): Buffer => createHash("sha256").update(token, "utf8").digest();
