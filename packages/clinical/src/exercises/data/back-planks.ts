import { exercise, form } from "../define";
import { holdDose } from "../dose-ranges";
import type { Exercise } from "../exercise";
import { front, lieOnFront, lieOnSide, pose, side } from "../pose";

const propped = pose(lieOnFront, {
  trunk: 62,
  neck: 12,
  hip: [-28, -28],
  shoulder: [62, 62],
  elbow: [90, 90],
  fixed: "near-toe",
  x: 14,
});
const planked = pose(propped, { trunk: 82, neck: 0, hip: [0, 0], ankle: [-18, -18], shoulder: [82, 82] });
const sidePropped = pose(lieOnSide, {
  trunk: -62,
  hip: [28, -28],
  shoulder: [20, 62],
  elbow: [4, 80],
  fixed: "far-ankle",
  x: 104,
});
const sidePlanked = pose(sidePropped, { trunk: -80, hip: [0, 0], shoulder: [10, 80] });

export const backPlanks: readonly Exercise[] = [
  exercise({
    key: "plank",
    name: "Front plank",
    region: "back",
    kinds: ["strength"],
    purpose: "Builds staying power of the whole front of the trunk.",
    start: "Lie on your front, propped on your forearms.",
    steps: [
      "Tuck the tail under a little and tighten your buttocks.",
      "Lift until you are one line from shoulder to heel or knee.",
      "Breathe, and lower before the back sags.",
    ],
    cautions: [
      "Do not hold your breath, above all with high blood pressure.",
      "Stop if the lower back aches.",
    ],
    sides: "together",
    muscles: ["belly", "shoulders", "buttocks"],
    place: "floor-or-bed",
    supports: ["helper"],
    dose: holdDose,
    figure: side(propped, planked, "pelvis"),
    standard: "knees",
    leadsTo: null,
    forms: [
      form("wall", 2, "leaning on a wall", "Stand and lean your forearms on a wall."),
      form("knees", 4, "on the knees", "Keep your knees on the floor."),
      form("toes", 5, "on the toes", "Lift on to your toes."),
      form("one-foot", 7, "one foot lifted", "Lift one foot a little, half the time each."),
    ],
  }),
  exercise({
    key: "side-plank",
    name: "Side plank",
    region: "back",
    kinds: ["strength"],
    purpose: "Strengthens the side of the trunk, which carries you when you hold a bag in one hand.",
    start: "Lie on your side, propped on the forearm, elbow under the shoulder.",
    steps: [
      "Push the floor away.",
      "Lift the hips until the body is one line.",
      "Breathe, then lower with control.",
    ],
    cautions: ["If the shoulder hurts, use the wall form.", "Do not let the head hang."],
    sides: "one-at-a-time",
    muscles: ["side of the trunk", "outer hip", "shoulder"],
    place: "floor-or-bed",
    supports: ["wall"],
    dose: holdDose,
    figure: front(sidePropped, sidePlanked, "pelvis"),
    standard: "knees",
    leadsTo: null,
    forms: [
      form("wall", 2, "leaning on a wall", "Stand sideways and lean the forearm on a wall."),
      form("knees", 4, "knees bent", "Bend your knees and lift from them."),
      form("feet", 6, "legs straight", "Lift from the feet, legs straight."),
      form("leg-up", 8, "upper leg lifted", "Lift the upper leg as well."),
    ],
  }),
];
