import { type Refusal, refusal } from "@withy/core/refusal";
import type { OfferState, RoundState } from "./waiting-words";

export interface OfferFacts {
  readonly offer: OfferState;
  readonly round: RoundState;
  readonly expiresAt: Date;
  readonly now: Date;
  readonly entry: "waiting" | "booked" | "withdrawn";
  /** Whether therapist and a room are still free for the whole visit. */
  readonly isTimeFree: boolean;
  /** Whether the patient has no other visit at that time. */
  readonly isPatientFree: boolean;
}

/** What a person who opens the link finds. Only an "open" offer can be answered. */
export type OfferStanding =
  | "open"
  | "yours"
  | "declined"
  | "gone"
  | "expired"
  | "stopped"
  | "settled"
  | "busy";

/** What an offer is worth at this moment, whatever has been written down about it so far. */
export function offerStanding(f: OfferFacts): OfferStanding {
  if (f.offer === "accepted") return "yours";
  if (f.offer === "declined") return "declined";
  if (f.offer === "lost" || f.round === "taken") return "gone";
  if (f.offer === "stopped" || f.round === "stopped") return "stopped";
  if (f.offer === "expired" || f.round === "expired" || f.now >= f.expiresAt) return "expired";
  if (f.entry !== "waiting") return "settled";
  if (!f.isTimeFree) return "gone";
  return f.isPatientFree ? "open" : "busy";
}

const sentences: Record<Exclude<OfferStanding, "open">, string> = {
  yours: "You have taken this time already.",
  declined: "You have said no to this time. Ring us if you would like it after all.",
  gone: "Someone else was quicker, and the time has gone. You stay on our list.",
  expired: "The time to answer is over. You stay on our list.",
  stopped: "This time is no longer on offer. You stay on our list.",
  settled: "You are no longer on our list for another time. Ring us if that is not right.",
  busy: "You have another appointment with us at that time. Ring us to change it.",
};

/** Why an offer cannot be answered any more; null where it can. */
export function checkAnswer(standing: OfferStanding): Refusal | null {
  return standing === "open" ? null : refusal(`offer-${standing}`, sentences[standing]);
}
