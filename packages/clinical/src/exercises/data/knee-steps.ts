import { exercise, form } from "../define";
import { strengthDose } from "../dose-ranges";
import type { Exercise } from "../exercise";
import { pose, prop, side, stand } from "../pose";

const onStep = pose(stand, {
  hip: [6, -16],
  knee: [6, 34],
  shoulder: [30, 10],
  elbow: [40, 30],
  height: 14,
  x: 78,
});

export const kneeSteps: readonly Exercise[] = [
  exercise({
    key: "step-up",
    name: "Step up",
    region: "knee",
    kinds: ["strength", "balance"],
    purpose: "Trains each leg by itself for stairs, kerbs and buses.",
    start: "Stand facing a step. Put one whole foot on it.",
    steps: [
      "Lean a little forward over the front foot.",
      "Press up tall; the back leg only follows.",
      "Lower slowly, with the same leg doing the work.",
    ],
    cautions: ["The step must not slide.", "Hold a rail if you are not sure of your balance."],
    sides: "one-at-a-time",
    muscles: ["thigh", "buttock"],
    supports: ["rail", "wall", "helper"],
    dose: strengthDose,
    figure: side(
      pose(stand, {
        trunk: 10,
        hip: [62, 4],
        knee: [60, 4],
        ankle: [8, 4],
        fixed: "near-ankle",
        height: 14,
        x: 78,
      }),
      onStep,
      "pelvis",
      prop("step", 62),
    ),
    standard: "fifteen",
    withoutEquipment: { exercise: "standing-knee-lift", form: "hip-height" },
    leadsTo: "step-down",
    forms: [
      form("ten", 2, "10 cm step", "Use a low step or a thick book.", ["step"]),
      form("fifteen", 3, "15 cm step", "Use an ordinary low step.", ["step"]),
      form("stair", 4, "a full stair", "Use the bottom stair.", ["stairs"]),
      form(
        "stair-slow",
        5,
        "a full stair, four counts down",
        "Use the bottom stair and take four counts to lower.",
        ["stairs"],
      ),
    ],
  }),
  exercise({
    key: "step-down",
    name: "Step down",
    region: "knee",
    kinds: ["strength", "balance"],
    purpose: "Builds the control that going downstairs asks of the thigh.",
    start: "Stand on a step on one leg, the other foot hanging in front.",
    steps: [
      "Bend the standing knee slowly, in line with the toes.",
      "Let the other heel brush the floor.",
      "Press up tall again without pushing off.",
    ],
    cautions: ["Hold a rail.", "Make the step lower if the knee shakes or hurts at the front."],
    sides: "one-at-a-time",
    muscles: ["thigh", "outer hip"],
    supports: ["rail", "wall"],
    dose: strengthDose,
    figure: side(
      pose(stand, { hip: [2, 14], knee: [4, 4], height: 14, x: 50 }),
      pose(stand, { trunk: 12, hip: [44, 40], knee: [50, 10], ankle: [18, 14], height: 14, x: 50 }),
      "pelvis",
      prop("step", 22),
    ),
    standard: "ten",
    withoutEquipment: { exercise: "split-squat", form: "half" },
    leadsTo: "split-squat",
    forms: [
      form("five", 3, "5 cm step", "Use a thick book or a doorstep.", ["step"]),
      form("ten", 5, "10 cm step", "Use a low step.", ["step"]),
      form("stair", 6, "a full stair", "Use the bottom stair, facing down.", ["stairs"]),
    ],
  }),
];
