import type { Source } from "../measures/measure";

export const flagAnswers = ["not-asked", "absent", "present"] as const;
export type FlagAnswer = (typeof flagAnswers)[number];

export interface RedFlag {
  readonly key: string;
  readonly question: string;
}

export interface RedFlagGroup {
  readonly key: string;
  readonly concern: string;
  /** What to do where one is present. Local policy and clinical judgement come first. */
  readonly action: string;
  readonly isEmergency: boolean;
  /** Regions for which it is asked; empty for all. */
  readonly regions: readonly string[];
  readonly source: Source;
  readonly flags: readonly RedFlag[];
}

/** Said wherever the list is shown. */
export const redFlagCaution =
  "A prompt, not a diagnosis. Your judgement and your practice's policy come first.";

const spine = ["neck", "upper-back", "lower-back", "pelvis", "general"];
const read = (citation: string): Source => ({ citation, standing: "read" });
const memory = (citation: string): Source => ({ citation: `${citation}, from memory`, standing: "memory" });

export const redFlagGroups: readonly RedFlagGroup[] = [
  {
    key: "cauda-equina",
    concern: "Nerves at the base of the spine",
    action: "Send to hospital today as an emergency, with a phone call ahead.",
    isEmergency: true,
    regions: ["lower-back", "pelvis", "general"],
    source: read("BMJ Best Practice; Physiotherapy, March 2024"),
    flags: [
      { key: "bladder-bowel", question: "New trouble passing or holding urine, or with the bowel" },
      { key: "saddle-numbness", question: "Numb or changed feeling between the legs" },
      { key: "both-legs", question: "Weakness, numbness or pain in both legs" },
      { key: "sexual-function", question: "New change in sexual function" },
    ],
  },
  {
    key: "joint-infection",
    concern: "Infected joint",
    action: "Send to hospital today as an emergency. Do not treat the joint.",
    isEmergency: true,
    regions: [],
    source: read("BMJ Best Practice"),
    flags: [{ key: "hot-joint", question: "Sudden hot, swollen joint, above all with fever" }],
  },
  {
    key: "fracture",
    concern: "Fracture",
    action: "Stop loading. Arrange an X-ray through the route your practice uses today.",
    isEmergency: false,
    regions: [],
    source: memory("IFOMPT framework 2020"),
    flags: [
      { key: "trauma", question: "A hard fall or blow before the pain" },
      { key: "thin-bones", question: "A small fall or none, with thin bones or older age" },
      { key: "steroids", question: "Long use of steroids" },
    ],
  },
  {
    key: "cancer",
    concern: "Cancer",
    action: "Speak to the GP today and write what you found and who you spoke to.",
    isEmergency: false,
    regions: [],
    source: memory("IFOMPT framework 2020"),
    flags: [
      { key: "past-cancer", question: "Cancer in the past" },
      { key: "weight-loss", question: "Weight lost without trying" },
      { key: "night-pain", question: "Pain at night that no position eases" },
    ],
  },
  {
    key: "infection",
    concern: "Infection of the spine or elsewhere",
    action: "Speak to the GP or the hospital today.",
    isEmergency: false,
    regions: [],
    source: memory("IFOMPT framework 2020"),
    flags: [
      { key: "fever", question: "Fever, or feeling ill with it" },
      { key: "immune", question: "Weak defences: medicines, illness, or injected drugs" },
    ],
  },
  {
    key: "cord",
    concern: "Pressure on the spinal cord",
    action: "Do not manipulate. Arrange an urgent specialist opinion today.",
    isEmergency: false,
    regions: spine,
    source: { citation: "common practice", standing: "common practice" },
    flags: [
      { key: "clumsy-hands", question: "New clumsiness of the hands" },
      { key: "walking-change", question: "New unsteadiness in walking" },
    ],
  },
];

/** The groups that are asked for a region. */
export function redFlagsFor(regionKey: string): readonly RedFlagGroup[] {
  return redFlagGroups.filter((group) => group.regions.length === 0 || group.regions.includes(regionKey));
}

export interface RedFlagReading {
  readonly asked: number;
  readonly of: number;
  readonly present: readonly {
    readonly question: string;
    readonly concern: string;
    readonly action: string;
    readonly isEmergency: boolean;
  }[];
  /** "Red flags asked, none", "2 present", "4 of 13 asked". */
  readonly words: string;
}

/** What was asked and found, with what to do for each flag that is present; emergencies first. */
export function readRedFlags(
  regionKey: string,
  answers: Readonly<Record<string, FlagAnswer>>,
): RedFlagReading {
  const all = redFlagsFor(regionKey).flatMap((group) =>
    group.flags.map((flag) => ({ group, flag, answer: answers[flag.key] ?? "not-asked" })),
  );
  const asked = all.filter((a) => a.answer !== "not-asked").length;
  const present = all
    .filter((a) => a.answer === "present")
    .map(({ group, flag }) => ({
      question: flag.question,
      concern: group.concern,
      action: group.action,
      isEmergency: group.isEmergency,
    }))
    .sort((a, b) => Number(b.isEmergency) - Number(a.isEmergency));
  return { asked, of: all.length, present, words: flagWords(asked, all.length, present.length) };
}

function flagWords(asked: number, of: number, present: number): string {
  if (present > 0) return `Red flags: ${present} present`;
  if (asked === 0) return "Red flags not asked";
  return asked === of ? "Red flags asked, none" : `Red flags: ${asked} of ${of} asked`;
}
