import type { Random } from "./random";
import type { Visit } from "./visit";

/** What a place is called in a sentence, with its side. */
export function placeOf(visit: Visit): string {
  const { side, region } = visit.course.episode;
  const word =
    {
      "lower-back": "lower back",
      "lower-leg": "calf and Achilles tendon",
      "ankle-foot": "ankle",
      balance: "balance",
    }[region] ?? region;
  return side === "left" || side === "right" ? `${side} ${word}` : side === "both" ? `both ${word}s` : word;
}

const examined: Readonly<Record<string, readonly string[]>> = {
  "lower-back": [
    "Bends forward with fingers to mid shin, stiff on rising. Straight leg raise equal. Strength, feeling and reflexes of the legs normal.",
    "Extension half of usual, ache at the end. Walks on heels and toes. Reflexes equal.",
  ],
  knee: [
    "Flexion 120°, extension full. No swelling. Single-leg squat wobbles at 40°.",
    "Small effusion. Flexion 115°. Step down painful at 15 cm. Ligaments firm.",
  ],
  hip: [
    "Flexion 95°, internal rotation 12° against 35° on the other side. Hip drops at the eighth step up.",
    "Flexion 105°, internal rotation 20°. Single-leg stand 22 seconds, level.",
  ],
  shoulder: [
    "Lifts to 120° in front, arc of pain from 80°. External rotation 45°. Strength 4 of 5 on turning out.",
    "Lifts to 150°. External rotation 60°. Carries 2 kg to the shelf with some ache.",
  ],
  neck: [
    "Turns 50° left and 60° right. Arm strength, feeling and reflexes normal.",
    "Turns 65° each way. Upper back stiff on bending.",
  ],
  elbow: [
    "Grip 60% of the other side, sore on the outer bony point. Elbow and wrist full.",
    "Grip 80% of the other side, no rest pain.",
  ],
  "lower-leg": [
    "Heel raise six on the sore side, 25 on the other. Tendon thick and sore two finger widths up.",
    "Heel raise 18, pain 3 of 10. Morning stiffness ten minutes.",
  ],
  "ankle-foot": [
    "Knee to wall 4 cm against 10. Drawer test firm. Single-leg stand eight seconds.",
    "Knee to wall 8 cm. Hops five times with care.",
  ],
  balance: [
    "Heel to toe stand seven seconds. Turns in six steps. Feeling in both feet normal.",
    "Heel to toe stand 16 seconds. Steps over a 10 cm block without looking down.",
  ],
};
const treated = [
  "Strength work, three sets of eight, at an effort of 7 of 10.",
  "Practised the step, slowly, hand near the rail.",
  "Mobilised the joint within comfort, then moved it actively through the new range.",
  "Graded loading, talked through pain that is fine and pain that is not.",
  "Balance work by the worktop, then carrying.",
];
const since = [
  "Better by half, sleeps through.",
  "Much the same, did the exercises on four days.",
  "A sore day after the garden, settled by the next morning.",
  "Easier on stairs, still stiff on rising.",
  "Pleased. Forgot the exercises at the weekend.",
  "Worse for two days after a long drive, now back to where it was.",
];
const responses = [
  "Pain 3 during, 2 after.",
  "Tired, no more pain.",
  "Easier straight after, asked to say how the next morning is.",
  "No change during. Comfortable on leaving.",
];
const plans = [
  "Programme moved up one step. Seen again in a week.",
  "Same programme, ten more days. Ring if two mornings are worse.",
  "Seen again in two weeks. Then by itself if stairs stay easy.",
  "Bring the trainers next time. Three sessions before then.",
];
const health = [
  "Well. Blood pressure tablets. No allergies known.",
  "Diabetes, tablets. No operations. No allergies known.",
  "Well, no medicines. Allergic to penicillin.",
  "Asthma, inhaler with her. No allergies known.",
];
const impacts = [
  "Stopped the garden and long walks. Wants those back most.",
  "Works through it, tired by evening. Sleep broken twice a night.",
  "Cannot lift the youngest. Wants that first.",
  "Off the bicycle for two months. Wants to ride to work.",
];
const origins = [
  "Came on over six weeks with no blow or fall.",
  "Began after a week of lifting.",
  "On and off for two years, worse since summer.",
  "Slipped on wet steps in the autumn, walked home.",
  "Slow in coming, worse on cold mornings.",
];
const advice = [
  "Keep moving, pace it, and what to watch for explained.",
  "Heat before, walk after. When to ring us explained.",
  "Pain up to 5 of 10 is fine if settled by next morning.",
];
const consent = "Explained what I found, the options and their risks; agreed to go on.";

/** A note as a busy therapist writes it, in the headings of its kind. Our own words. */
export function noteWords(random: Random, visit: Visit, number: number): Record<string, string> {
  const place = placeOf(visit);
  const found = examined[visit.course.episode.region] ?? ["Moves fully, ache at the end of range."];
  if (visit.isFirst) {
    return {
      history: `Pain in the ${place}. ${random.pick(origins)}`,
      impact: random.pick(impacts),
      background: random.pick(health),
      examination: found[0] ?? "",
      assessment: `${visit.course.episode.problem}. Nothing today that points to a more serious cause.`,
      consent,
      treatment: random.pick(treated),
      advice: random.pick(advice),
      plan: `${visit.course.plannedVisits} visits, home programme given. ${random.pick(plans)}`,
    };
  }
  return {
    history: random.pick(since),
    examination: found[Math.min(number - 1, found.length - 1)] ?? "",
    consent,
    treatment: random.pick(treated),
    response: random.pick(responses),
    plan: random.pick(plans),
  };
}
