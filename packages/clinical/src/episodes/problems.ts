/**
 * Working problems offered for a region. Our own short list of plain names; free words are always allowed, and none
 * of them is a diagnosis code.
 */
export const workingProblems: Readonly<Record<string, readonly string[]>> = {
  head: ["Jaw pain", "Headache that comes from the neck"],
  neck: ["Neck pain", "Neck pain with arm symptoms", "Neck pain after an accident", "Stiff neck"],
  shoulder: [
    "Shoulder pain on lifting the arm",
    "Stiff (frozen) shoulder",
    "Shoulder out of joint, after",
    "Rotator cuff repair, after",
    "Shoulder osteoarthritis",
  ],
  elbow: ["Outer elbow pain", "Inner elbow pain", "Stiff elbow after a fracture"],
  "wrist-hand": [
    "Wrist fracture, after",
    "Thumb base osteoarthritis",
    "Wrist tendon pain",
    "Carpal tunnel symptoms",
  ],
  "upper-back": ["Upper back pain", "Rib pain", "Spinal fracture with thin bones, after"],
  "lower-back": [
    "Low back pain",
    "Low back pain with leg symptoms",
    "Narrowed spinal canal",
    "Lumbar surgery, after",
  ],
  pelvis: ["Pelvic girdle pain", "Pelvic girdle pain in pregnancy"],
  hip: [
    "Hip osteoarthritis",
    "Outer hip pain",
    "Groin pain",
    "Hip replacement, after",
    "Hip fracture, after",
  ],
  thigh: ["Hamstring strain", "Quadriceps strain", "High hamstring tendon pain"],
  knee: [
    "Knee osteoarthritis",
    "Pain behind the kneecap",
    "Kneecap tendon pain",
    "Meniscus problem",
    "Cruciate ligament injury",
    "Knee replacement, after",
  ],
  "lower-leg": ["Calf strain", "Shin pain", "Achilles tendon pain"],
  "ankle-foot": ["Ankle sprain", "Ankle fracture, after", "Heel pain", "Forefoot pain"],
  balance: ["Unsteady, with falls", "Unsteady, without falls", "Afraid of falling"],
  general: [
    "Widespread pain",
    "Joint hypermobility with symptoms",
    "Low fitness after illness",
    "Osteoporosis",
  ],
};

export function problemsOf(regionKey: string): readonly string[] {
  return workingProblems[regionKey] ?? [];
}
