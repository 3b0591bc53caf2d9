import { exercise, form } from "../define";
import { mobilityDose, strengthDose } from "../dose-ranges";
import type { Exercise } from "../exercise";
import { pose, prop, side, sit, stand } from "../pose";

const hinged = pose(stand, {
  trunk: 62,
  hip: [74, 74],
  knee: [16, 16],
  ankle: [4, 4],
  shoulder: [62, 62],
  x: 50,
});

export const hipHinging: readonly Exercise[] = [
  exercise({
    key: "hip-hinge",
    name: "Hip hinge",
    region: "hip",
    kinds: ["strength"],
    purpose: "Teaches the hips, not the back, to do the bending when you reach down or lift.",
    start: "Stand with your feet under your hips and your knees soft.",
    steps: [
      "Push your hips back as if closing a drawer behind you.",
      "Let your hands slide down your thighs, back long and flat.",
      "When you feel the back of the thighs, press the hips forward and stand tall.",
    ],
    cautions: [
      "Go only as far as the back stays flat.",
      "With known bone thinning, keep the weight light and ask first.",
    ],
    sides: "together",
    muscles: ["buttocks", "back of the thigh", "long back muscles"],
    place: "open-floor",
    supports: ["worktop", "chair-back", "wall"],
    dose: strengthDose,
    figure: side(pose(stand, { x: 50 }), hinged, "shoulder"),
    standard: "hands-to-knees",
    withoutEquipment: { exercise: "hip-hinge", form: "hands-to-knees" },
    leadsTo: "single-leg-hinge",
    forms: [
      form(
        "to-wall",
        2,
        "touch the wall behind",
        "Stand a foot's length from a wall and touch it with your hips.",
      ),
      form("hands-to-knees", 3, "hands slide to knees", "Stop when your hands reach your knees."),
      form(
        "hands-to-shins",
        4,
        "hands slide to shins",
        "Go on until your hands reach the middle of your shins.",
      ),
      form("kettlebell", 6, "with a kettlebell", "Hold the kettlebell close to your thighs all the way.", [
        "kettlebell",
      ]),
    ],
  }),
  exercise({
    key: "single-leg-hinge",
    name: "One-leg hinge",
    region: "hip",
    kinds: ["strength", "balance"],
    purpose: "Joins strength and balance of one hip, as when you pick something up in passing.",
    start: "Stand on one leg with the knee soft, the other toes just behind you.",
    steps: [
      "Push the hips back and let the free leg float behind.",
      "Keep both hip bones facing the floor.",
      "Press the standing foot down and come up tall.",
    ],
    cautions: ["Keep a worktop within reach.", "Stop when the pelvis starts to twist."],
    sides: "one-at-a-time",
    muscles: ["buttocks", "back of the thigh"],
    place: "open-floor",
    dose: strengthDose,
    figure: side(
      pose(stand, { x: 56 }),
      pose(stand, { trunk: 56, hip: [64, -14], knee: [10, 10], ankle: [0, -20], shoulder: [56, 56], x: 56 }),
      "far-ankle",
    ),
    standard: "toe-behind",
    withoutEquipment: { exercise: "single-leg-hinge", form: "to-shin" },
    forms: [
      form("toe-behind", 5, "back toes on the floor", "Keep the back toes on the floor for balance."),
      form("foot-floats", 6, "back foot floats", "Let the back foot leave the floor."),
      form("to-shin", 7, "reach to the shin", "Reach the opposite hand to the middle of the shin."),
      form("weight", 8, "with a hand weight", "Hold a weight in the hand opposite the standing leg.", [
        "weight",
      ]),
    ],
  }),
  exercise({
    key: "sitting-bow",
    name: "Sitting bow",
    region: "hip",
    kinds: ["mobility"],
    purpose: "Practises the bend at the hips that lets you reach your feet.",
    start: "Sit on a firm chair, feet flat and wider than your hips.",
    steps: [
      "Lean forward from the hips with a long back.",
      "Slide your hands down the inside of your shins.",
      "Press through your feet and come up slowly.",
    ],
    cautions: [
      "Come up slowly if you get dizzy.",
      "After a hip replacement, ask before bending past a right angle.",
    ],
    sides: "together",
    muscles: ["hip joint", "back of the thigh"],
    place: null,
    supports: ["chair-back"],
    dose: mobilityDose,
    figure: side(
      sit,
      pose(sit, { trunk: 58, hip: [148, 148], shoulder: [70, 70], elbow: [6, 6] }),
      "shoulder",
      prop("chair", 24),
    ),
    standard: "to-shins",
    withoutEquipment: { exercise: "hip-hinge", form: "hands-to-knees" },
    forms: [
      form("to-knees", 1, "hands to the knees", "Lean until your forearms rest on your thighs.", ["chair"]),
      form("to-shins", 2, "hands to the shins", "Slide your hands to the middle of your shins.", ["chair"]),
      form("to-floor", 3, "hands to the floor", "Reach for the floor between your feet.", ["chair"]),
    ],
  }),
];
