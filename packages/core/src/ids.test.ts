import { afterEach, describe, expect, it, vi } from "vitest";
import { isId, newId } from "./ids";

afterEach(() => {
  vi.useRealTimers();
});

/** The first 48 bits of a UUIDv7 are milliseconds since 1970: RFC 9562, section 5.7. */
const instantOf = (id: string): number => Number.parseInt(id.replaceAll("-", "").slice(0, 12), 16);

describe("a new id", () => {
  it("has the form of a UUID of version 7", () => {
    const id = newId();
    expect(id).toMatch(/^[\da-f]{8}-[\da-f]{4}-7[\da-f]{3}-[89ab][\da-f]{3}-[\da-f]{12}$/);
    expect(isId(id)).toBe(true);
  });

  it("tells when it was made", () => {
    // Later than any clock that this process has seen: an id never falls behind the one before it.
    vi.useFakeTimers({ now: new Date("2999-12-01T09:00:00.123Z") });
    expect(new Date(instantOf(newId())).toISOString()).toBe("2999-12-01T09:00:00.123Z");
  });

  it("comes after all made before it, also within one millisecond, and never twice", () => {
    const ids = Array.from({ length: 20_000 }, newId);
    expect(ids).toEqual([...ids].sort());
    expect(new Set(ids).size).toBe(ids.length);
  });

  it("comes after them also where the machine's clock is put back", () => {
    vi.useFakeTimers({ now: new Date("2999-12-02T09:00:00Z") });
    const before = newId();
    vi.setSystemTime(new Date("2999-12-02T08:00:00Z"));
    expect(newId() > before).toBe(true);
  });
});

it.each([
  "",
  "0",
  "019ad5a1-6c00-7000-8000-00000000000",
  "019ad5a1-6c00-7000-8000-0000000000000",
  "019ad5a16c0070008000000000000000",
  "{019ad5a1-6c00-7000-8000-000000000000}",
  "019ad5a1-6c00-7000-8000-00000000000g",
  "019ad5a1-6c00-7000-0000-000000000000",
  "' or 1=1 --",
  17,
  null,
  undefined,
  ["019ad5a1-6c00-7000-8000-000000000000"],
])("%j is no id", (value) => expect(isId(value)).toBe(false));
