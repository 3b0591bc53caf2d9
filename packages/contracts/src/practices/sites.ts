import { z } from "zod";
import { idField } from "../fields";

export const listSitesInput = z.strictObject({});
export interface SiteView {
  readonly id: string;
  readonly name: string;
  readonly zone: string;
  readonly nation: "england" | "wales" | "scotland" | "northern-ireland";
  readonly isStepFree: boolean;
}

export const listTherapistsInput = z.strictObject({});
export interface TherapistView {
  readonly id: string;
  readonly name: string;
  readonly jobTitle: string;
  readonly homeSiteId: string;
}

export const chooseDeskSiteInput = z.strictObject({ siteId: idField });
