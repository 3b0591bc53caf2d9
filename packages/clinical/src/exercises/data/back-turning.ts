import { exercise, form } from "../define";
import { mobilityDose } from "../dose-ranges";
import type { Exercise } from "../exercise";
import { above, front, pose, prop, sitFront, standFront } from "../pose";

const kneesUp = pose(standFront, { hip: [10, 10], knee: [10, 10], seen: [0.5, 0.5], shoulder: [70, 70] });

export const backTurning: readonly Exercise[] = [
  exercise({
    key: "knee-rolls",
    name: "Knee rolls",
    region: "back",
    kinds: ["mobility"],
    purpose: "Turns the lower back gently from side to side.",
    start: "Lie on your back, knees bent and together, arms out.",
    steps: [
      "Let both knees sink to one side.",
      "Keep both shoulders heavy.",
      "Bring the knees up and go to the other side.",
    ],
    cautions: ["Go only as far as it stays comfortable.", "After a hip replacement, ask first."],
    sides: "together",
    muscles: ["lower back", "side of the trunk"],
    place: "floor-or-bed",
    supports: ["helper"],
    dose: mobilityDose,
    figure: above(kneesUp, pose(kneesUp, { hip: [62, -42], knee: [70, -50], seen: [0.9, 0.9] }), "near-knee"),
    standard: "feet-down",
    withoutEquipment: { exercise: "knee-rolls", form: "feet-down" },
    leadsTo: "seated-turn",
    forms: [
      form("small", 1, "a little each way", "Move only a hand's width each way."),
      form("feet-down", 2, "feet stay down", "Keep your feet on the bed."),
      form("ball", 3, "calves on a ball", "Rest your calves on a ball and roll it.", ["ball"]),
      form("feet-up", 4, "feet off the bed", "Lift your feet and keep the knees at right angles."),
    ],
  }),
  exercise({
    key: "seated-turn",
    name: "Seated turn",
    region: "back",
    kinds: ["mobility"],
    purpose: "Keeps the upper back turning, for looking behind you in the car.",
    start: "Sit tall on a firm chair, arms crossed on your chest.",
    steps: [
      "Turn your chest to one side, hips still.",
      "Breathe out and go a little further.",
      "Come back slowly.",
    ],
    cautions: ["Grow tall before you turn.", "With bone thinning of the spine, keep it small."],
    sides: "one-at-a-time",
    muscles: ["upper back"],
    supports: ["chair-back"],
    dose: mobilityDose,
    figure: front(
      pose(sitFront, { shoulder: [40, 40], elbow: [-120, -120], height: 0, x: 52 }),
      pose(sitFront, { trunk: 8, shoulder: [74, 10], elbow: [-120, -120], height: 0, x: 52 }),
      "near-elbow",
      prop("stool", 44),
    ),
    standard: "arms-crossed",
    withoutEquipment: { exercise: "book-opening", form: "knees-bent" },
    leadsTo: null,
    forms: [
      form("hands-on-thighs", 1, "hands on the thighs", "Slide one hand back along the thigh.", ["chair"]),
      form("arms-crossed", 2, "arms crossed", "Cross your arms on your chest.", ["chair"]),
      form("arms-wide", 5, "stick across the shoulders", "Rest a stick across your shoulders.", [
        "chair",
        "stick",
      ]),
    ],
  }),
  exercise({
    key: "book-opening",
    name: "Open the book",
    region: "back",
    kinds: ["mobility"],
    purpose: "Opens the chest and turns the upper back without load.",
    start: "Lie on your side, knees bent, arms straight in front, palms together.",
    steps: [
      "Lift the upper arm and open it across to the other side.",
      "Follow the hand with your eyes; the knees stay together.",
      "Breathe, then close.",
    ],
    cautions: ["Support the head with a pillow.", "With a sore shoulder, bend the elbow."],
    sides: "one-at-a-time",
    muscles: ["upper back", "chest"],
    place: "floor-or-bed",
    supports: ["wall"],
    dose: mobilityDose,
    figure: above(
      pose(standFront, { hip: [30, -30], knee: [60, -60], shoulder: [90, -90], elbow: [0, 0] }),
      pose(standFront, { hip: [30, -30], knee: [60, -60], shoulder: [90, 90], elbow: [0, 0] }),
      "far-hand",
    ),
    standard: "knees-bent",
    withoutEquipment: { exercise: "book-opening", form: "knees-bent" },
    leadsTo: null,
    forms: [
      form("hand-on-chest", 1, "hand on the chest", "Keep the hand on your chest and lead with the elbow."),
      form("knees-bent", 2, "arm straight", "Keep the arm straight."),
      form(
        "knee-on-cushion",
        3,
        "upper knee on a cushion",
        "Rest the upper knee on a cushion and straighten the lower leg.",
        ["cushion"],
      ),
    ],
  }),
];
