import type { Role } from "@withy/core/access/roles";

export interface WorkPlan {
  readonly site: string;
  readonly weekdays: readonly number[];
  readonly startsAt: string;
  readonly endsAt: string;
  readonly breaks: readonly { startsAt: string; endsAt: string; label: string }[];
  readonly everyWeeks?: number;
}

export interface PersonPlan {
  readonly given: string;
  readonly family: string;
  readonly title: string;
  readonly registration?: string;
  readonly home: string;
  readonly roles: readonly (readonly [Role, string | null])[];
  readonly signIn: string;
  readonly work: readonly WorkPlan[];
  readonly isGymOnly?: boolean;
}

export interface SitePlan {
  readonly key: string;
  readonly name: string;
  readonly lines: readonly string[];
  readonly postcode: string;
  readonly phone: string;
  readonly isStepFree: boolean;
  readonly opensAt: string;
  readonly closesAt: string;
  readonly saturday?: { readonly opensAt: string; readonly closesAt: string };
  readonly rooms: readonly string[];
  readonly gym?: string;
}

export interface ServicePlan {
  readonly key: "initial" | "followUp" | "gym" | "strength";
  readonly name: string;
  readonly kind: "initial" | "follow-up" | "other";
  readonly minutes: number;
  readonly cleanDown: number;
  readonly room: "treatment" | "gym";
  readonly pence: number;
}

/** What a practice is before anyone has been treated there. */
export interface PracticePlan {
  readonly name: string;
  readonly legalName: string;
  readonly lines: readonly string[];
  readonly postcode: string;
  readonly phone: string;
  readonly email: string;
  readonly vatNumber: string | null;
  readonly invoicePrefix: string;
  readonly utilisationTarget: number;
  /** 1: as busy as a good practice is; 0.5: half as busy. */
  readonly busyness: number;
  readonly sites: readonly SitePlan[];
  readonly people: readonly PersonPlan[];
  readonly services: readonly ServicePlan[];
  readonly products: readonly { readonly name: string; readonly pence: number }[];
  /** What insurers pay of the list price. */
  readonly payerDiscount: number;
}
