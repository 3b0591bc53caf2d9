/** What may stand in a room, by its code; a service asks for it, and so may a patient. */
export const equipment = [
  { code: "plinth-hydraulic", word: "a hydraulic plinth" },
  { code: "plinth-wide", word: "a wide plinth" },
  { code: "parallel-bars", word: "parallel bars" },
  { code: "treadmill", word: "a treadmill" },
  { code: "bike", word: "an exercise bike" },
  { code: "traction", word: "a traction table" },
  { code: "ultrasound", word: "an ultrasound unit" },
  { code: "hoist", word: "a hoist" },
] as const;

export const equipmentCodes: readonly string[] = equipment.map((e) => e.code);

/** "parallel bars and a treadmill"; a code of another list stands as it is. */
export function equipmentWords(codes: readonly string[]): string {
  const words = codes.map((code) => equipment.find((e) => e.code === code)?.word ?? code);
  if (words.length < 2) return words.join("");
  return `${words.slice(0, -1).join(", ")} and ${words.at(-1)}`;
}
