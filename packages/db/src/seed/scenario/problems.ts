import type { ProblemPlan } from "../visit";

const limb = ["left", "right"] as const;
const middle = ["none"] as const;

/** Why people come, in about the shares of a general musculoskeletal clinic (common practice). */
export const problems: readonly ProblemPlan[] = [
  { problem: "Low back pain", region: "lower-back", sides: middle },
  { problem: "Low back pain", region: "lower-back", sides: middle },
  { problem: "Low back pain with leg symptoms", region: "lower-back", sides: ["left", "right"] },
  { problem: "Knee osteoarthritis", region: "knee", sides: ["left", "right", "both"] },
  { problem: "Pain behind the kneecap", region: "knee", sides: limb },
  { problem: "Hip osteoarthritis", region: "hip", sides: limb },
  { problem: "Outer hip pain", region: "hip", sides: limb },
  { problem: "Shoulder pain on lifting the arm", region: "shoulder", sides: limb },
  { problem: "Stiff (frozen) shoulder", region: "shoulder", sides: limb },
  { problem: "Neck pain", region: "neck", sides: middle },
  { problem: "Outer elbow pain", region: "elbow", sides: limb },
  { problem: "Achilles tendon pain", region: "lower-leg", sides: limb },
  { problem: "Ankle sprain", region: "ankle-foot", sides: limb },
  { problem: "Unsteady, without falls", region: "balance", sides: middle },
];

export const goalsByRegion: Readonly<Record<string, readonly string[]>> = {
  "lower-back": ["Sit through a working morning", "Lift the shopping without bracing", "Sleep through"],
  knee: ["Stairs foot over foot", "Walk the sea wall and back", "Kneel in the garden"],
  hip: ["Walk to the harbour and back, 30 minutes", "Put on socks without help", "Stairs without the rail"],
  shoulder: ["Reach the top shelf", "Sleep on that side", "Swim ten lengths"],
  neck: ["Reverse the car without turning from the waist", "Work two hours at the desk"],
  elbow: ["Carry a full kettle", "Play a set of tennis"],
  "lower-leg": ["Run five kilometres", "Stand a shift"],
  "ankle-foot": ["Walk on shingle", "Back to netball"],
  balance: ["Take the bus alone", "Carry a tray across the room"],
};
