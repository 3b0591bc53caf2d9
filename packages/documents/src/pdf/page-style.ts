/** Lengths are points: 72 to the inch. */
export const mm = (millimetres: number): number => (millimetres * 72) / 25.4;

export const page = {
  width: mm(210),
  height: mm(297),
  left: mm(20),
  right: mm(20),
  top: mm(16),
  /** Room for the footer. */
  bottom: mm(24),
} as const;

/** The inks of the screens these papers come from. */
export const ink = {
  text: "#1F2724",
  soft: "#55605A",
  rule: "#857E6B",
  hair: "#DDD6C4",
  bottle: "#21503F",
  oxide: "#7A2E1D",
  warn: "#7A5200",
  danger: "#9B1C2E",
} as const;

export interface TextStyle {
  readonly face: "serif" | "sans";
  /** Points. */
  readonly size: number;
  /** Points from one baseline to the next. */
  readonly leading: number;
  readonly color: string;
}

export const textStyles = {
  title: { face: "serif", size: 19, leading: 25, color: ink.text },
  heading: { face: "sans", size: 10.5, leading: 15, color: ink.bottle },
  body: { face: "serif", size: 11, leading: 16, color: ink.text },
  table: { face: "sans", size: 10, leading: 14, color: ink.text },
  small: { face: "sans", size: 9, leading: 12.5, color: ink.soft },
} as const satisfies Record<string, TextStyle>;
