import type { PlainDateText } from "@withy/core/zoned-time";

export type Side = "left" | "right" | "both" | "none";

/** Something that was written in a note, and where. */
export interface NotedText {
  readonly noteId: string;
  readonly noteKind: "initial" | "session";
  readonly on: PlainDateText;
  /** The heading of the note that it stands under. */
  readonly part: string;
  readonly text: string;
}

/** One outcome measure over the episode. `last` equals `first` where it was taken once. */
export interface MeasureFact {
  readonly key: string;
  readonly name: string;
  /** For the margin: "Chair stand". */
  readonly shortName: string;
  readonly first: { readonly score: string; readonly on: PlainDateText };
  readonly last: { readonly recordId: string; readonly score: string; readonly on: PlainDateText };
  readonly timesTaken: number;
  /** "out of 10" or "times in 30 seconds"; empty where the score says it itself. */
  readonly scale: string;
  /** What the change means by the published figures, as a sentence; null where it was taken once. */
  readonly change: string | null;
  /** Where the last score stands against a published value, as a sentence. */
  readonly standing: string | null;
}

export interface ProgrammeFact {
  readonly programmeId: string;
  readonly on: PlainDateText;
  /** Each with its form in brackets. */
  readonly exercises: readonly string[];
  readonly rounds: number;
  /** Length of one session in seconds. */
  readonly sessionSeconds: number;
  readonly sessionsPerWeek: number;
}

export interface RedFlagFacts {
  readonly absent: readonly string[];
  readonly present: readonly string[];
  /** How many were not asked about. */
  readonly notAsked: number;
}

/** Everything that a discharge letter says, as plain data taken from the record. */
export interface DischargeFacts {
  /** The day the letter is dated; years are left out of dates in the same year only in the margin. */
  readonly today: PlainDateText;
  readonly patient: { readonly id: string; readonly name: string };
  readonly recipientIsReferrer: boolean;
  readonly episode: {
    readonly id: string;
    readonly problem: string;
    readonly side: Side;
    readonly openedOn: PlainDateText;
    readonly referral: {
      readonly source: "gp" | "self" | "insurer" | "employer" | "consultant" | "other";
      readonly by: string | null;
      readonly on: PlainDateText | null;
      readonly reason: string | null;
    };
    readonly goals: readonly { readonly text: string; readonly metOn: PlainDateText | null }[];
    readonly redFlags: RedFlagFacts;
  };
  readonly visits: {
    readonly attended: number;
    readonly missed: number;
    readonly firstOn: PlainDateText | null;
    readonly lastOn: PlainDateText | null;
  };
  readonly history: readonly NotedText[];
  /** Examination in the therapist's words, first and last. */
  readonly examined: { readonly first: NotedText | null; readonly last: NotedText | null };
  readonly measures: readonly MeasureFact[];
  readonly treatments: readonly NotedText[];
  readonly programme: ProgrammeFact | null;
  readonly advice: readonly NotedText[];
  /** The plan of the last note, in the therapist's words. */
  readonly plan: NotedText | null;
}
