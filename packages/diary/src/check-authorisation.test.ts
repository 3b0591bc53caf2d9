import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { checkAuthorisation, visitsLeft } from "./check-authorisation";

const limit = (authorised: number, used: number) => ({ payerName: "Kelderwick Health", authorised, used });

describe("what a payer has authorised", () => {
  it.each([
    [6, 0, 6, null],
    [6, 2, 4, null],
    [
      6,
      2,
      5,
      "Kelderwick Health has authorised 6 visits and 2 are used or booked. Book 4 visits or fewer, or",
    ],
    [6, 5, 2, "Kelderwick Health has authorised 6 visits and 5 are used or booked. Book 1 visit, or"],
    [1, 1, 1, "has authorised 1 visit and 1 is used or booked. Write down a new authorisation"],
    [4, 7, 1, "Write down a new authorisation"],
  ])("%i authorised, %i used, %i wanted", (authorised, used, wanted, says) => {
    const found = checkAuthorisation(limit(authorised, used), wanted);
    if (says === null) expect(found).toBeNull();
    else {
      expect(found).toMatchObject({ kind: "not-authorised", field: "visits" });
      expect(found?.message).toContain(says);
    }
  });

  it("allows any number where no limit stands", () => {
    expect(checkAuthorisation(null, 60)).toBeNull();
  });

  it("allows exactly what is left", () => {
    const n = fc.integer({ min: 0, max: 60 });
    fc.assert(
      fc.property(n, n, n, (authorised, used, wanted) => {
        const isAllowed = checkAuthorisation(limit(authorised, used), wanted) === null;
        expect(isAllowed).toBe(wanted <= visitsLeft(limit(authorised, used)));
      }),
    );
  });
});
