import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { checkAnswer, type OfferFacts, type OfferStanding, offerStanding } from "./offer-standing";
import { offerStates, roundStates } from "./waiting-words";

const now = new Date("2026-12-01T09:00:00Z");
const open: OfferFacts = {
  ...{ offer: "open", round: "open", entry: "waiting", isTimeFree: true, isPatientFree: true },
  ...{ now, expiresAt: new Date(now.getTime() + 1) },
};

describe("what an offer is worth", () => {
  it.each<[Partial<OfferFacts>, OfferStanding]>([
    [{}, "open"],
    [{ offer: "accepted", round: "taken", entry: "booked", isTimeFree: false }, "yours"],
    [{ offer: "declined" }, "declined"],
    [{ offer: "lost", round: "taken" }, "gone"],
    [{ round: "taken" }, "gone"],
    [{ isTimeFree: false }, "gone"],
    [{ expiresAt: now }, "expired"],
    [{ offer: "expired", round: "expired" }, "expired"],
    [{ offer: "stopped", round: "stopped" }, "stopped"],
    [{ round: "stopped", expiresAt: now }, "stopped"],
    [{ entry: "booked" }, "settled"],
    [{ entry: "withdrawn" }, "settled"],
    [{ isPatientFree: false }, "busy"],
  ])("%j: %s", (change, standing) => expect(offerStanding({ ...open, ...change })).toBe(standing));

  it("is open only where nothing at all speaks against it", () => {
    const facts = fc.record<OfferFacts>({
      offer: fc.constantFrom(...offerStates),
      round: fc.constantFrom(...roundStates),
      entry: fc.constantFrom("waiting" as const, "booked" as const, "withdrawn" as const),
      isTimeFree: fc.boolean(),
      isPatientFree: fc.boolean(),
      now: fc.constant(now),
      expiresAt: fc.integer({ min: -2, max: 2 }).map((ms) => new Date(now.getTime() + ms)),
    });
    fc.assert(
      fc.property(facts, (f) => {
        const isSound =
          f.offer === "open" &&
          f.round === "open" &&
          f.entry === "waiting" &&
          f.isTimeFree &&
          f.isPatientFree &&
          f.expiresAt > f.now;
        expect(checkAnswer(offerStanding(f)) === null).toBe(isSound);
      }),
      { numRuns: 1_000 },
    );
  });

  it("says what to do wherever it cannot be answered", () => {
    for (const standing of ["yours", "declined", "gone", "expired", "stopped", "settled", "busy"] as const)
      expect(checkAnswer(standing)).toMatchObject({
        kind: `offer-${standing}`,
        message: expect.stringMatching(/^[A-Z].+\.$/),
      });
  });
});
