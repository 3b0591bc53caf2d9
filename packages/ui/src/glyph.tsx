export type GlyphName =
  | "ring"
  | "check"
  | "arrow"
  | "disc"
  | "dash"
  | "cross"
  | "struck"
  | "hatch"
  | "find"
  | "down"
  | "up"
  | "left"
  | "right"
  | "tick"
  | "warn"
  | "plus";

/** A small drawn sign in the colour of its text. Always beside a word, so it is hidden from screen readers. */
export function Glyph({ name }: { name: GlyphName }) {
  return <i className="glyph" data-glyph={name} aria-hidden="true" />;
}
