export const noteKinds = ["initial", "session"] as const;
export type NoteKind = (typeof noteKinds)[number];

export interface Heading {
  readonly key: string;
  readonly label: string;
  /** Stands faintly on the empty line. */
  readonly prompt: string;
  readonly isRequired: boolean;
  /** A whole sentence that one press writes, where most visits need the same one. */
  readonly ready?: string;
}

const consent: Heading = {
  key: "consent",
  label: "Consent",
  prompt: "What was explained, and what the patient agreed to",
  isRequired: true,
  ready: "Explained what I found, the options and their risks; agreed to go on.",
};

const initialHeadings: readonly Heading[] = [
  {
    key: "history",
    label: "History",
    prompt: "How it began, how it has gone, what helps, what makes it worse",
    isRequired: true,
  },
  {
    key: "impact",
    label: "What it stops",
    prompt: "Work, sleep, sport, care of others, and what matters most",
    isRequired: true,
  },
  {
    key: "background",
    label: "General health",
    prompt: "Conditions, medicines, operations, allergies or none known",
    isRequired: true,
  },
  {
    key: "examination",
    label: "Examination",
    prompt: "What you looked at and tested, with side and figures",
    isRequired: true,
  },
  { key: "findings", label: "Findings", prompt: "What stood out, and what was normal", isRequired: false },
  {
    key: "assessment",
    label: "Assessment",
    prompt: "The working problem, and why you think so",
    isRequired: true,
  },
  consent,
  {
    key: "treatment",
    label: "Treatment given",
    prompt: "What you did, how much, on which side",
    isRequired: false,
  },
  {
    key: "response",
    label: "Response",
    prompt: "During, straight after, and what was reported",
    isRequired: false,
  },
  {
    key: "advice",
    label: "Advice",
    prompt: "What you told the patient, and what to watch for",
    isRequired: false,
  },
  { key: "plan", label: "Plan", prompt: "What the patient does, what you do, by when", isRequired: true },
];

const sessionHeadings: readonly Heading[] = [
  {
    key: "history",
    label: "Since last visit",
    prompt: "What has changed, in the patient's words",
    isRequired: true,
  },
  {
    key: "examination",
    label: "Examination",
    prompt: "What you tested again, with side and figures",
    isRequired: true,
  },
  consent,
  {
    key: "treatment",
    label: "Treatment given",
    prompt: "What you did, how much, on which side",
    isRequired: true,
  },
  {
    key: "response",
    label: "Response",
    prompt: "During, straight after, and what was reported",
    isRequired: false,
  },
  { key: "assessment", label: "Assessment", prompt: "What changed, and why you think so", isRequired: false },
  {
    key: "advice",
    label: "Advice",
    prompt: "What you told the patient, and what to watch for",
    isRequired: false,
  },
  { key: "plan", label: "Plan", prompt: "What the patient does, what you do, by when", isRequired: true },
];

const byKind: Record<NoteKind, readonly Heading[]> = { initial: initialHeadings, session: sessionHeadings };

/** The headings of a kind of note, in the order in which they are written and printed. */
export function headingsOf(kind: NoteKind): readonly Heading[] {
  return byKind[kind];
}

export const noteKindLabels: Record<NoteKind, string> = {
  initial: "Initial assessment",
  session: "Session note",
};
