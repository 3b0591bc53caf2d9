import { exercise, form } from "../define";
import { aerobicDose } from "../dose-ranges";
import type { Exercise } from "../exercise";
import { pose, prop, side, stand } from "../pose";

const breathless = "You should be able to talk but not sing.";
const chestPain = "Chest pain, faintness or a racing heart that does not settle: stop and ring 999.";
const stride = pose(stand, {
  hip: [26, -20],
  knee: [6, 16],
  ankle: [-14, -16],
  shoulder: [-26, 26],
  elbow: [30, 40],
  x: 70,
});
const marched = pose(stand, {
  hip: [70, 0],
  knee: [80, 0],
  shoulder: [-20, 40],
  elbow: [60, 60],
  fixed: "far-ankle",
});

export const aerobicWalking: readonly Exercise[] = [
  exercise({
    key: "brisk-walk",
    name: "Brisk walk",
    region: "aerobic",
    kinds: ["aerobic"],
    purpose: "Trains heart and lungs and lifts the mood, with no equipment.",
    start: "Put on shoes that hold your feet. Choose a way you know.",
    steps: [
      "Walk at your own pace for two minutes.",
      "Speed up until you breathe more deeply.",
      "Slow down for the last two minutes.",
    ],
    cautions: [breathless, chestPain],
    sides: "together",
    muscles: ["legs", "heart and lungs"],
    place: "open-floor",
    supports: ["stick", "two-sticks", "helper"],
    dose: aerobicDose,
    figure: side(
      stride,
      pose(stride, { hip: [-20, 26], knee: [16, 6], ankle: [-16, -14], shoulder: [26, -26], x: 40 }),
      null,
    ),
    standard: "steady",
    leadsTo: null,
    forms: [
      form("short", 1, "short and level", "Walk on the level, with rests when you like."),
      form("steady", 3, "steady and brisk", "Walk briskly without stopping."),
      form("hills", 5, "with a hill", "Choose a way with a hill."),
      form(
        "bursts",
        6,
        "with fast bursts",
        "Walk as fast as you can between two lamp posts, then easily to the next.",
      ),
    ],
  }),
  exercise({
    key: "march",
    name: "March on the spot",
    region: "aerobic",
    kinds: ["aerobic", "balance"],
    purpose: "Warms you up and trains the heart in a small room.",
    start: "Stand tall beside a worktop.",
    steps: [
      "Lift one knee, then the other, in a steady beat.",
      "Let the arms swing.",
      "Put the feet down softly.",
    ],
    cautions: [breathless, chestPain],
    sides: "together",
    muscles: ["front of the hips", "heart and lungs"],
    place: "worktop",
    dose: aerobicDose,
    figure: side(stand, marched, "near-knee", prop("worktop", 94)),
    standard: "standing",
    withoutEquipment: { exercise: "march", form: "low-standing" },
    leadsTo: "stair-climb",
    forms: [
      form("sitting", 1, "sitting", "Sit on a firm chair and march with your feet.", ["chair"]),
      form("low-standing", 2, "standing, low knees", "Lift the feet only a little."),
      form("standing", 3, "standing, knees half way", "Lift the knees half way."),
      form("high", 5, "high knees, strong arms", "Lift the knees to hip height and swing the arms."),
    ],
  }),
  exercise({
    key: "stair-climb",
    name: "Stair climbing",
    region: "aerobic",
    kinds: ["aerobic", "strength"],
    purpose: "Trains heart and thighs with something most homes have.",
    start: "Stand at the foot of a flight of stairs with a rail.",
    steps: [
      "Climb at a steady pace, whole foot on each stair.",
      "Come down slowly.",
      "Rest at the bottom if you need to.",
    ],
    cautions: ["Hold the rail.", breathless, chestPain],
    sides: "together",
    muscles: ["thighs", "buttocks", "heart and lungs"],
    supports: ["rail"],
    dose: aerobicDose,
    figure: side(
      pose(stand, {
        trunk: 8,
        hip: [58, 0],
        knee: [58, 0],
        ankle: [4, 0],
        shoulder: [30, 10],
        elbow: [30, 20],
        fixed: "far-ankle",
        x: 48,
      }),
      pose(stand, {
        trunk: 6,
        hip: [8, -14],
        knee: [4, 30],
        shoulder: [20, 30],
        elbow: [30, 30],
        fixed: "near-ankle",
        x: 74,
        height: 14,
      }),
      "pelvis",
      prop("step", 62),
    ),
    standard: "flight",
    withoutEquipment: { exercise: "march", form: "high" },
    leadsTo: null,
    forms: [
      form("half", 3, "half a flight", "Climb half a flight and come down.", ["stairs"]),
      form("flight", 4, "a whole flight", "Climb the whole flight.", ["stairs"]),
      form("repeat", 6, "flights without a pause", "Climb one flight after another for the set time.", [
        "stairs",
      ]),
    ],
  }),
];
