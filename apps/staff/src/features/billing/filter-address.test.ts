import { describe, expect, it } from "vitest";
import { readFilterAddress, toListInput, writeFilterAddress } from "./filter-address";

const read = (query: string) => readFilterAddress(new URLSearchParams(query));

describe("the filter in the address", () => {
  it("is who owes, where nothing is said", () => {
    expect(toListInput(read(""))).toEqual({ kind: "owed", page: 1 });
    expect(writeFilterAddress(read(""))).toBe("/billing");
  });

  it("is read back as it was written", () => {
    const address = "/billing?kind=paid&age=31-60&payer=patients&site=s1&find=O%27Neill+4&page=3";
    expect(writeFilterAddress(read(address.split("?")[1] ?? ""))).toBe(address);
  });

  it("forgives an address that makes no sense", () => {
    expect(read("kind=nonsense&age=old&page=-2")).toMatchObject({ kind: "owed", age: undefined, page: 1 });
  });
});
