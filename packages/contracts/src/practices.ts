import { z } from "zod";
import { idField } from "./fields";

export const listSitesInput = z.strictObject({});
export interface SiteView {
  readonly id: string;
  readonly name: string;
  readonly zone: string;
  readonly nation: "england" | "wales" | "scotland" | "northern-ireland";
  readonly isStepFree: boolean;
}

export const chooseDeskSiteInput = z.strictObject({ siteId: idField });
