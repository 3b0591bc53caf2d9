import { z } from "zod";
import { idField, requiredText } from "../fields";

export const listApiKeysInput = z.strictObject({});

export const makeApiKeyInput = z.strictObject({
  name: requiredText(80, "Enter what the key is for, such as the program that reads the diary."),
});
export type MakeApiKeyInput = z.input<typeof makeApiKeyInput>;

export const revokeApiKeyInput = z.strictObject({ apiKeyId: idField });

export interface ApiKeyRow {
  readonly id: string;
  readonly name: string;
  readonly createdAt: string;
  readonly createdByName: string;
  /** The last day on which it was used; null for never. */
  readonly lastUsedOn: string | null;
  readonly revokedAt: string | null;
}

/** A new key; its secret is given once, since only its hash is kept. */
export interface NewApiKeyView {
  readonly secret: string;
  readonly keys: readonly ApiKeyRow[];
}
