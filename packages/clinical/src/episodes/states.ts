import { type Refusal, refusal } from "@withy/core/refusal";

export const episodeStates = ["open", "discharged"] as const;
export type EpisodeState = (typeof episodeStates)[number];
export type EpisodeAct = "treat" | "discharge" | "reopen";

export const episodeMoves: Record<EpisodeState, Readonly<Partial<Record<EpisodeAct, EpisodeState>>>> = {
  open: { treat: "open", discharge: "discharged" },
  discharged: { reopen: "open" },
};

export const episodeStateLabels: Record<EpisodeState, string> = { open: "Open", discharged: "Discharged" };

/** How a course of care ended, as the letter and the owner's figures say it. */
export const outcomes = [
  "goals-met",
  "goals-partly-met",
  "referred-on",
  "stopped-attending",
  "moved-away",
  "asked-to-stop",
] as const;
export type Outcome = (typeof outcomes)[number];

export const outcomeLabels: Record<Outcome, string> = {
  "goals-met": "Goals met",
  "goals-partly-met": "Goals partly met",
  "referred-on": "Referred on",
  "stopped-attending": "Stopped attending",
  "moved-away": "Moved away",
  "asked-to-stop": "Asked to stop",
};

export const referralSources = ["self", "gp", "consultant", "insurer", "employer", "other"] as const;
export type ReferralSource = (typeof referralSources)[number];

export const referralSourceLabels: Record<ReferralSource, string> = {
  self: "Came of their own accord",
  gp: "GP",
  consultant: "Consultant",
  insurer: "Insurer",
  employer: "Employer",
  other: "Someone else",
};

const isAllowed = (state: EpisodeState, act: EpisodeAct): boolean => episodeMoves[state][act] !== undefined;

/** Whether notes and measures may be added to the episode. */
export function checkTreat(episode: { state: EpisodeState }): Refusal | null {
  if (isAllowed(episode.state, "treat")) return null;
  return refusal(
    "episode-discharged",
    "This episode is discharged. Reopen it, or open a new one for a new problem.",
  );
}

/** Whether the episode may end: open, and every note of it signed. */
export function checkDischarge(episode: {
  state: EpisodeState;
  unsignedNotes: number;
  signedNotes: number;
}): Refusal | null {
  if (!isAllowed(episode.state, "discharge"))
    return refusal("already-discharged", "This episode is already discharged.");
  if (episode.unsignedNotes > 0) {
    const notes = episode.unsignedNotes === 1 ? "One note is" : `${episode.unsignedNotes} notes are`;
    return refusal(
      "notes-unsigned",
      `${notes} not signed yet. Sign every note of this episode, then discharge.`,
    );
  }
  if (episode.signedNotes > 0) return null;
  return refusal(
    "nothing-written",
    "This episode has no signed note. Write and sign one before discharging, so that the record says what was done.",
  );
}

/** Whether a discharged episode may be opened again. */
export function checkReopen(episode: { state: EpisodeState }): Refusal | null {
  return isAllowed(episode.state, "reopen") ? null : refusal("still-open", "This episode is still open.");
}
