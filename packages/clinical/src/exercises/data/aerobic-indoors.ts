import { exercise, form } from "../define";
import { aerobicDose } from "../dose-ranges";
import type { Exercise } from "../exercise";
import { front, pose, prop, side, sit, stand, standFront } from "../pose";

const breathless = "You should be able to talk but not sing.";
const chestPain = "Chest pain, faintness or a racing heart that does not settle: stop and ring 999.";

export const aerobicIndoors: readonly Exercise[] = [
  exercise({
    key: "cycle",
    name: "Exercise cycle",
    region: "aerobic",
    kinds: ["aerobic"],
    purpose: "Trains the heart with little weight on hips and knees.",
    start: "Set the saddle so that the knee is almost straight at the lowest point.",
    steps: [
      "Start with almost no resistance.",
      "Pedal smoothly at a pace you can keep.",
      "Add resistance until you breathe more deeply.",
    ],
    cautions: [breathless, chestPain, "A knee that hurts at the top wants a higher saddle."],
    sides: "together",
    muscles: ["thighs", "heart and lungs"],
    supports: ["helper"],
    dose: aerobicDose,
    figure: side(
      pose(sit, {
        trunk: 22,
        hip: [104, 44],
        knee: [84, 30],
        ankle: [0, 0],
        shoulder: [70, 70],
        elbow: [10, 10],
        fixed: "pelvis",
        x: 46,
      }),
      pose(sit, {
        trunk: 22,
        hip: [44, 104],
        knee: [30, 84],
        ankle: [0, 0],
        shoulder: [70, 70],
        elbow: [10, 10],
        fixed: "pelvis",
        x: 46,
      }),
      "near-knee",
      prop("rail", 84),
    ),
    standard: "steady",
    withoutEquipment: { exercise: "brisk-walk", form: "steady" },
    leadsTo: null,
    forms: [
      form("easy", 1, "no resistance", "Pedal with almost no resistance.", ["cycle"]),
      form("steady", 3, "steady", "Add resistance until you breathe more deeply.", ["cycle"]),
      form("bursts", 6, "with bursts", "Pedal hard for thirty seconds, then easily for a minute.", ["cycle"]),
    ],
  }),
  exercise({
    key: "side-to-side",
    name: "Side to side steps",
    region: "aerobic",
    kinds: ["aerobic", "balance"],
    purpose: "Gets you warm and moves you in a direction that walking forgets.",
    start: "Stand with your feet together and room on both sides.",
    steps: [
      "Step out to one side and bring the other foot to meet it.",
      "Step back the other way.",
      "Let the arms swing out with each step.",
    ],
    cautions: [breathless, chestPain, "Clear the floor of rugs and leads."],
    sides: "together",
    muscles: ["outer hips", "heart and lungs"],
    place: "open-floor",
    dose: aerobicDose,
    figure: front(
      standFront,
      pose(standFront, { hip: [24, 8], shoulder: [50, 50], elbow: [10, 10] }),
      "near-ankle",
    ),
    standard: "steady",
    leadsTo: null,
    forms: [
      form("slow", 2, "slow, small steps", "Take small steps at an easy pace."),
      form("steady", 3, "steady, arms swing", "Take wider steps and swing your arms."),
      form("quick", 5, "quick and low", "Bend your knees and go quickly."),
    ],
  }),
  exercise({
    key: "shadow-punch",
    name: "Reach and punch",
    region: "aerobic",
    kinds: ["aerobic"],
    purpose: "Trains heart and lungs with the arms when the legs need a rest.",
    start: "Sit or stand tall, fists at your chest.",
    steps: [
      "Reach one fist forward, then the other.",
      "Turn the chest a little with each reach.",
      "Keep a steady beat.",
    ],
    cautions: [breathless, chestPain, "With a sore shoulder, reach lower."],
    sides: "together",
    muscles: ["shoulders", "heart and lungs"],
    supports: ["chair-back"],
    dose: aerobicDose,
    figure: side(
      pose(stand, { shoulder: [10, 10], elbow: [126, 126] }),
      pose(stand, { shoulder: [86, 6], elbow: [4, 126] }),
      "near-hand",
    ),
    standard: "standing",
    withoutEquipment: { exercise: "shadow-punch", form: "standing" },
    leadsTo: "march",
    forms: [
      form("sitting", 1, "sitting", "Sit on a firm chair.", ["chair"]),
      form("standing", 2, "standing", "Stand with your feet under your hips."),
      form("step", 4, "with a step forward", "Step forward with each reach."),
    ],
  }),
];
