import { z } from "zod";

export const getPracticeSettingsInput = z.strictObject({});

export interface SiteSettings {
  readonly id: string;
  readonly name: string;
  readonly addressLines: readonly string[];
  readonly postcode: string;
  readonly phone: string;
  readonly isStepFree: boolean;
  readonly hours: readonly {
    readonly weekday: number;
    readonly opensAt: string;
    readonly closesAt: string;
  }[];
  readonly rooms: readonly { readonly id: string; readonly name: string; readonly kind: string }[];
}

export interface ServiceSettings {
  readonly id: string;
  readonly name: string;
  readonly durationMinutes: number;
  readonly cleanDownMinutes: number;
  readonly isActive: boolean;
  readonly prices: readonly {
    readonly id: string;
    readonly amountPence: number;
    readonly siteName: string | null;
    readonly payerName: string | null;
    readonly vatTreatment: string;
  }[];
}

export interface PatternSettings {
  readonly id: string;
  readonly therapistName: string;
  readonly siteName: string;
  readonly weekday: number;
  readonly startsAt: string;
  readonly endsAt: string;
  readonly breaks: readonly { readonly startsAt: string; readonly endsAt: string; readonly label: string }[];
  readonly everyWeeks: number;
  readonly validUntil: string | null;
}

/** How the practice is set up, as it stands today. */
export interface PracticeSettingsView {
  readonly name: string;
  readonly legalName: string;
  readonly vatNumber: string | null;
  readonly noticeHours: number;
  readonly utilisationTarget: number;
  readonly paymentDays: number;
  readonly sites: readonly SiteSettings[];
  readonly services: readonly ServiceSettings[];
  readonly patterns: readonly PatternSettings[];
}
