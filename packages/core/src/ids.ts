import { v7, validate } from "uuid";

/** A new id: UUIDv7, so that rows made together lie together in every index. */
export function newId(): string {
  return v7();
}

export function isId(value: unknown): value is string {
  return typeof value === "string" && validate(value);
}
