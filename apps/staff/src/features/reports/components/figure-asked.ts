import type { FigureKey, PayerKind } from "@withy/contracts/reports";

/** Which figure is opened, and whose part of it. */
export interface FigureAsked {
  figure: FigureKey;
  therapistId?: string;
  siteId?: string;
  payerKind?: PayerKind;
  /** Whose or what part, after the figure's name: "Ana Ferreby". */
  who?: string;
}
