import { chairStand } from "./catalogue/chair-stand";
import { fastWalk } from "./catalogue/fast-walk";
import { fiveTimesSitToStand } from "./catalogue/five-times-sit-to-stand";
import { hoos } from "./catalogue/hoos";
import { hoosPs } from "./catalogue/hoos-ps";
import { koos } from "./catalogue/koos";
import { koosPs } from "./catalogue/koos-ps";
import { mskHq, neckDisability, oxfordHip, oxfordKnee, quickDash, startBack } from "./catalogue/licensed";
import { lowerExtremityFunctional } from "./catalogue/lower-extremity-functional";
import { painRating } from "./catalogue/pain-rating";
import { gad7, phq2, phq9 } from "./catalogue/patient-health";
import { patientSpecificFunctional } from "./catalogue/patient-specific-functional";
import { rolandMorris } from "./catalogue/roland-morris";
import { stairClimb } from "./catalogue/stair-climb";
import { timedUpAndGo } from "./catalogue/timed-up-and-go";
import type { Measure } from "./measure";

/** Every measure, in the order in which the list offers them. */
export const measureCatalogue: readonly Measure[] = [
  painRating,
  patientSpecificFunctional,
  chairStand,
  timedUpAndGo,
  fiveTimesSitToStand,
  fastWalk,
  stairClimb,
  hoos,
  hoosPs,
  koos,
  koosPs,
  rolandMorris,
  lowerExtremityFunctional,
  phq2,
  phq9,
  gad7,
  quickDash,
  neckDisability,
  startBack,
  oxfordHip,
  oxfordKnee,
  mskHq,
];

const byKey = new Map(measureCatalogue.map((measure) => [measure.key, measure]));

export function findMeasure(key: string): Measure | null {
  return byKey.get(key) ?? null;
}
