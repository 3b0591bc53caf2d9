/** Words of the waiting list, light enough for the browser. */
export const urgencies = ["routine", "soon", "urgent"] as const;
export type Urgency = (typeof urgencies)[number];

export const urgencyWords: Record<Urgency, string> = { routine: "Routine", soon: "Soon", urgent: "Urgent" };

export const weekdayNames = [
  "Monday",
  "Tuesday",
  "Wednesday",
  "Thursday",
  "Friday",
  "Saturday",
  "Sunday",
] as const;

export const roundStates = ["open", "taken", "expired", "stopped"] as const;
export type RoundState = (typeof roundStates)[number];

export const roundWords: Record<RoundState, string> = {
  open: "On offer",
  taken: "Taken",
  expired: "Nobody took it",
  stopped: "Stopped",
};

export const offerStates = ["open", "accepted", "declined", "lost", "expired", "stopped"] as const;
export type OfferState = (typeof offerStates)[number];

export const offerWords: Record<OfferState, string> = {
  open: "No answer yet",
  accepted: "Accepted",
  declined: "Said no",
  lost: "Told that it is gone",
  expired: "Did not answer in time",
  stopped: "Withdrawn",
};
