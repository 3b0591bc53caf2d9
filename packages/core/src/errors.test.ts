import { describe, expect, it } from "vitest";
import {
  AppError,
  type ErrorCode,
  httpStatus,
  isAppError,
  notFound,
  refused,
  refuseIf,
  stale,
} from "./errors";
import { refusal } from "./refusal";

/** What is thrown, for a look at more than its message. */
function thrownBy(work: () => void): unknown {
  try {
    work();
  } catch (error) {
    return error;
  }
  return undefined;
}

// Meanings of the numbers: RFC 9110, section 15.
it.each<[ErrorCode, number]>([
  ["unauthenticated", 401],
  ["forbidden", 403],
  ["not-found", 404],
  ["refused", 409],
  ["stale", 412],
  ["invalid", 422],
  ["unavailable", 503],
])("%s answers %i", (code, status) => expect(httpStatus[code]).toBe(status));

it("no two codes answer alike, so that a screen can tell them apart", () => {
  expect(new Set(Object.values(httpStatus)).size).toBe(7);
});

describe("a failure that a caller may see", () => {
  it("is an error with a code, and its kind is the code where none is given", () => {
    const error = new AppError("forbidden", "Ask the owner for this.");
    expect(error).toBeInstanceOf(Error);
    expect({ ...error, message: error.message }).toEqual({
      name: "AppError",
      code: "forbidden",
      kind: "forbidden",
      message: "Ask the owner for this.",
      fields: [],
      detail: {},
    });
  });

  it("carries fields and detail", () => {
    const fields = [{ field: "lines.0.quantity", message: "Enter a whole number." }];
    const error = new AppError("invalid", "Look at the fields.", { fields, detail: { next: 3 } });
    expect(error).toMatchObject({ kind: "invalid", fields, detail: { next: 3 } });
  });

  it("is known by its name, also where two copies of the code are loaded", () => {
    class AppErrorOfAnotherCopy extends Error {
      override name = "AppError";
      code = "stale";
    }
    expect(isAppError(new AppErrorOfAnotherCopy())).toBe(true);
    expect(isAppError(notFound())).toBe(true);
  });

  it.each([
    [new Error("x")],
    [Object.assign(new Error("x"), { code: "ECONNREFUSED" })],
    [{ name: "AppError", code: "stale" }],
    ["AppError"],
    [null],
    [undefined],
  ])("%s is none", (other) => expect(isAppError(other)).toBe(false));
});

describe("a rule that says no", () => {
  const no = refusal("slot-taken", "That time is taken. Choose another.", "startsAt");

  it("becomes an error with its kind and its field", () => {
    const error = refused(no, { nextFree: ["10:00"] });
    expect(error).toMatchObject({
      code: "refused",
      kind: "slot-taken",
      message: no.message,
      fields: [{ field: "startsAt", message: no.message }],
      detail: { nextFree: ["10:00"] },
    });
    expect(refused(refusal("too-late", "It is too late for that.")).fields).toEqual([]);
  });

  it("is thrown, and one that says nothing is not", () => {
    expect(thrownBy(() => refuseIf(no))).toMatchObject({ code: "refused", kind: "slot-taken" });
    expect(thrownBy(() => refuseIf(null))).toBeUndefined();
  });
});

describe("sentences for a person", () => {
  it("names what was not found", () => {
    expect(notFound("invoice")).toMatchObject({ code: "not-found", kind: "not-found" });
    expect(notFound("invoice").message).toContain("could not find that invoice");
    expect(notFound().message).toContain("could not find that record");
  });

  it("says that someone else was first, and gives what they wrote", () => {
    const error = stale("note", { theirs: { version: 4 } });
    expect(error).toMatchObject({ code: "stale", detail: { theirs: { version: 4 } } });
    expect(error.message).toContain("changed this note");
    expect(stale("note").detail).toEqual({});
  });
});
