import { getFindingWeightsInput } from "@withy/contracts/diary";
import { verb } from "../verb";
import { readFindingWeights } from "./finding-weights";

/** How the practice ranks times when somebody finds one. */
export const getFindingWeights = verb("practice.manage", getFindingWeightsInput, (ctx) =>
  readFindingWeights(ctx),
);
