import type { OfferStanding } from "@withy/diary/offer-standing";
import { z } from "zod";

/** 256 random bits as base64url. */
export const offerTokenField = z.string().regex(/^[A-Za-z0-9_-]{43}$/);

export const offerAnswers = ["accept", "decline"] as const;
export type OfferAnswer = (typeof offerAnswers)[number];

/** What the private page of an offer says: time, place and therapist's name, and nothing about why. */
export interface OfferLinkView {
  readonly standing: OfferStanding;
  readonly practice: string;
  readonly phone: string;
  readonly greetingName: string;
  /** "Tuesday 8 December 2026", "10:15am", "10:45am", by the site's clock. */
  readonly dayWords: string;
  readonly startWords: string;
  readonly endWords: string;
  readonly place: string;
  readonly therapistName: string;
  /** "Tuesday 1 December 2026 at 11am". */
  readonly expiresWords: string;
  /** The visit that an acceptance gives up; null for someone without one. */
  readonly insteadOfWords: string | null;
}
