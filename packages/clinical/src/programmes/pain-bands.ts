import { type Refusal, refusal } from "@withy/core/refusal";

export const painBandNames = ["safe", "acceptable", "too-much"] as const;
export type PainBand = (typeof painBandNames)[number];

/** The highest score of the first two bands; everything above is too much. Scores are whole, 0 to 10. */
export interface PainBands {
  readonly safeTo: number;
  readonly acceptableTo: number;
}

/**
 * 0 to 2 safe, 3 to 5 acceptable, above 5 too much: the pain-monitoring model of Thomeé 1997 (from memory).
 * Clinics print other limits for the first band, so a practice may set its own; all agree that over 5 is too much.
 */
export const defaultPainBands: PainBands = { safeTo: 2, acceptableTo: 5 };

export const painBandWords: Record<PainBand, string> = {
  safe: "Safe: carry on",
  acceptable: "Acceptable, if it settles by next morning",
  "too-much": "Too much: stop or do the easier form",
};

/** The band of a pain score. Throws a RangeError for a score that is not a whole number from 0 to 10. */
export function painBand(score: number, bands: PainBands = defaultPainBands): PainBand {
  if (!Number.isInteger(score) || score < 0 || score > 10)
    throw new RangeError("pain is a whole number from 0 to 10");
  if (score <= bands.safeTo) return "safe";
  return score <= bands.acceptableTo ? "acceptable" : "too-much";
}

export function checkPainBands(bands: PainBands): Refusal | null {
  const whole = Number.isInteger(bands.safeTo) && Number.isInteger(bands.acceptableTo);
  if (!whole || bands.safeTo < 0 || bands.acceptableTo <= bands.safeTo) {
    return refusal(
      "pain-bands",
      "Give two whole numbers: the second band must end above the first.",
      "acceptableTo",
    );
  }
  // All published variants agree that more than 5 is too much.
  if (bands.acceptableTo > 5) {
    return refusal(
      "pain-bands",
      "End the acceptable band at 5 or below: over 5 is too much in every published model.",
      "acceptableTo",
    );
  }
  return null;
}
