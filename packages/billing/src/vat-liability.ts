import type { VatTreatment } from "./vat";

export const supplies = [
  "treatment",
  "supervised-class",
  "consumable-in-treatment",
  "goods",
  "unregistered-practitioner",
  "third-party-report",
  "occupational-health",
  "subject-access-copy",
  "room-rent",
  "opted-room-rent",
  "missed-appointment-fee",
] as const;
export type Supply = (typeof supplies)[number];

export interface VatLiability {
  readonly treatment: VatTreatment;
  /** The treatment is a starting point only: it turns on facts that the software cannot know. */
  readonly needsAdviser: boolean;
  readonly source: string;
}

/** What a clinic sells and how VAT usually falls on it. A practice sets each price itself; check with your adviser. */
const liabilities: Record<Supply, VatLiability> = {
  treatment: {
    treatment: "exempt",
    needsAdviser: false,
    source: "VAT Act 1994, Schedule 9, Group 7, item 1(c)",
  },
  "supervised-class": {
    treatment: "exempt",
    needsAdviser: false,
    source: "VAT Act 1994, Schedule 9, Group 7, item 1(c) and note 2; HMRC VATHLT2010",
  },
  "consumable-in-treatment": { treatment: "exempt", needsAdviser: false, source: "HMRC VATHLT2290" },
  goods: { treatment: "standard", needsAdviser: false, source: "HMRC VATHLT2290" },
  "unregistered-practitioner": { treatment: "standard", needsAdviser: false, source: "HMRC VATHLT2290" },
  "third-party-report": {
    treatment: "standard",
    needsAdviser: false,
    source: "d'Ambrumenil (C-307/01), as told in Tax Adviser, December 2016",
  },
  "occupational-health": {
    treatment: "standard",
    needsAdviser: true,
    source: "HMRC VATHLT2290 and VATHLT2310",
  },
  "subject-access-copy": {
    treatment: "outside-scope",
    needsAdviser: false,
    source: "Tax Adviser, December 2016",
  },
  "room-rent": {
    treatment: "exempt",
    needsAdviser: true,
    source: "Exempt as land where the area is defined and exclusive",
  },
  "opted-room-rent": {
    treatment: "standard",
    needsAdviser: true,
    source: "Taxed where the landlord opted, or mainly facilities are sold",
  },
  "missed-appointment-fee": {
    treatment: "exempt",
    needsAdviser: true,
    source: "HMRC Brief 13/2018, from memory",
  },
};

/** The usual VAT treatment of a supply, with its source. */
export function usualVatLiability(supply: Supply): VatLiability {
  return liabilities[supply];
}
