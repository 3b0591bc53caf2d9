import type { MessageState } from "../messaging";
import type { LetterSection, StaleSentence } from "./content";

export interface LetterRecipientView {
  readonly kind: "gp" | "patient" | "payer" | "other";
  readonly name: string;
  readonly addressLines: readonly string[];
  readonly email: string | null;
}

/** One line of "before you sign". What blocks must be put right first; the rest is for the writer's eye. */
export interface LetterCheck {
  readonly key: string;
  readonly isOk: boolean;
  readonly blocks: boolean;
  readonly words: string;
}

export interface LetterDeliveryView {
  readonly id: string;
  readonly channel: "email" | "print";
  readonly toName: string;
  readonly toAddress: string;
  readonly requestedAt: string;
  /** Null for print. */
  readonly state: MessageState | null;
  readonly sentAt: string | null;
  readonly firstOpenedAt: string | null;
  readonly problem: string | null;
  readonly expiresAt: string | null;
}

export interface LetterView {
  readonly id: string;
  readonly title: string;
  readonly reference: string;
  readonly state: "draft" | "signed";
  readonly version: number;
  readonly datedOn: string;
  readonly zone: string;
  readonly patient: {
    readonly id: string;
    readonly name: string;
    readonly bornOn: string;
    readonly nhsNumber: string | null;
    readonly addressLines: readonly string[];
    readonly email: string | null;
  };
  readonly episode: {
    readonly id: string;
    readonly problem: string;
    readonly place: string;
    readonly state: "open" | "discharged";
    readonly version: number;
  };
  readonly author: { readonly id: string; readonly name: string; readonly jobTitle: string };
  readonly sender: { readonly practice: string; readonly siteLine: string; readonly contactLine: string };
  readonly recipient: LetterRecipientView;
  readonly sections: readonly LetterSection[];
  /** Drafts only. */
  readonly stale: readonly StaleSentence[];
  /** What the record says and the draft does not. */
  readonly missing: readonly LetterSection[];
  readonly checks: readonly LetterCheck[];
  /** Whether the reader may write and sign: its author, while it is a draft. */
  readonly canWrite: boolean;
  readonly canSend: boolean;
  readonly updatedAt: string;
  readonly signedAt: string | null;
  readonly signedName: string | null;
  readonly registrationNumber: string | null;
  readonly deliveries: readonly LetterDeliveryView[];
}

export interface LetterRow {
  readonly id: string;
  readonly reference: string;
  readonly title: string;
  readonly state: "draft" | "signed";
  readonly patientId: string;
  readonly patientName: string;
  readonly recipientName: string;
  readonly authorName: string;
  readonly updatedAt: string;
  readonly signedAt: string | null;
  /** "Draft", "Signed, not sent", "Waiting to go", "Sent", "Opened", "Not sent". */
  readonly standing: string;
  readonly needsAttention: boolean;
}

/** What the private page shows before the letter is opened: nothing about the patient. */
export interface LetterLinkView {
  readonly practice: string;
  readonly contactLines: readonly string[];
  readonly reference: string;
  readonly expiresOn: string;
}
