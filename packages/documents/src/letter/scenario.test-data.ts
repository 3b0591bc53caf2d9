import type { DischargeFacts } from "./discharge-facts";

const id = (n: number) => `01890000-0000-7000-8000-${String(n).padStart(12, "0")}`;

/** A left hip, five visits, from the invented practice. */
export const hipFacts: DischargeFacts = {
  today: "2026-12-01",
  patient: { id: id(1), name: "Eleri Tamworth" },
  recipientIsReferrer: true,
  episode: {
    id: id(2),
    problem: "Hip osteoarthritis",
    side: "left",
    openedOn: "2026-10-06",
    referral: {
      source: "gp",
      by: "Dr Hanne Pryor",
      on: "2026-08-14",
      reason: "six months of left groin pain on walking and stairs",
    },
    goals: [
      { text: "Walk to the harbour and back", metOn: "2026-11-24" },
      { text: "Kneel in the garden.", metOn: null },
    ],
    redFlags: {
      present: [],
      absent: ["Fever or feeling unwell", "Unexplained weight loss"],
      notAsked: 1,
    },
  },
  visits: { attended: 5, missed: 1, firstOn: "2026-10-06", lastOn: "2026-12-01" },
  history: [
    {
      noteId: id(3),
      noteKind: "initial",
      on: "2026-10-06",
      part: "background",
      text: "takes an anticoagulant",
    },
  ],
  examined: {
    first: {
      noteId: id(3),
      noteKind: "initial",
      on: "2026-10-06",
      part: "examination",
      text: "Short steps on the left; cannot cross the leg.",
    },
    last: { noteId: id(4), noteKind: "session", on: "2026-12-01", part: "examination", text: "Even steps." },
  },
  measures: [
    {
      key: "pain",
      name: "Pain on walking",
      shortName: "Pain",
      scale: "out of 10",
      first: { score: "6", on: "2026-10-06" },
      last: { recordId: id(5), score: "3", on: "2026-12-01" },
      timesTaken: 3,
      change: "Better by 3, beyond measurement error (2.0).",
      standing: null,
    },
    {
      key: "chair-stand-30",
      name: "30-second chair stand",
      shortName: "Chair stand",
      scale: "stands",
      first: { score: "13", on: "2026-12-01" },
      last: { recordId: id(6), score: "13", on: "2026-12-01" },
      timesTaken: 1,
      change: null,
      standing: "Not below average for women 60 to 64: 12 or more expected.",
    },
  ],
  treatments: [
    {
      noteId: id(3),
      noteKind: "initial",
      on: "2026-10-06",
      part: "treatment",
      text: "advice and graded strength work",
    },
    {
      noteId: id(7),
      noteKind: "session",
      on: "2026-10-20",
      part: "treatment",
      text: "Advice and graded strength work",
    },
    { noteId: id(4), noteKind: "session", on: "2026-12-01", part: "treatment", text: "practice on stairs" },
  ],
  programme: {
    programmeId: id(8),
    on: "2026-11-24",
    exercises: [
      "sit to stand (from a chair, no hands)",
      "bridge (both feet down)",
      "side stepping (knees soft)",
    ],
    rounds: 2,
    sessionSeconds: 1200,
    sessionsPerWeek: 3,
  },
  advice: [
    {
      noteId: id(4),
      noteKind: "session",
      on: "2026-12-01",
      part: "advice",
      text: "Step down if two mornings are worse",
    },
  ],
  plan: {
    noteId: id(4),
    noteKind: "session",
    on: "2026-12-01",
    part: "plan",
    text: "May ring within six months without a new referral",
  },
};
