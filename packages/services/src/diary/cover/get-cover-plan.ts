import { type CoverPlanView, coverPlanInput } from "@withy/contracts/diary";
import { verb } from "../../verb";
import { readPlanView } from "./cover-view";

export const getCoverPlan = verb(
  "diary.book",
  coverPlanInput,
  (ctx, { coverPlanId }): Promise<CoverPlanView> => readPlanView(ctx, coverPlanId),
);
