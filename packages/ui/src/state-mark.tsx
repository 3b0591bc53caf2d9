import { Glyph, type GlyphName } from "./glyph";

/** How a state's edge is drawn. What it means is the caller's to say. */
export type EdgeName = "thin" | "double" | "thick" | "solid" | "dotted" | "broken" | "struck" | "hatch";

const glyphOf: Record<EdgeName, GlyphName> = {
  thin: "ring",
  double: "check",
  thick: "arrow",
  solid: "disc",
  dotted: "dash",
  broken: "cross",
  struck: "struck",
  hatch: "hatch",
};

/** The glyph that always goes with an edge. */
export function edgeGlyph(edge: EdgeName): GlyphName {
  return glyphOf[edge];
}

export interface StateMarkProps {
  /** The state's code, kept on the element for tests and styles. */
  code: string;
  /** The word on the screen: it always stays. */
  label: string;
  edge: EdgeName;
  /** Word and glyph without their edge, where the line or block carries the edge itself. */
  bare?: boolean;
}

/** A state as word, glyph and edge: told apart in grey and read out as a word. */
export function StateMark({ code, label, edge, bare = false }: StateMarkProps) {
  return (
    <span className="st" data-state={code} data-edge={edge} data-bare={bare ? "" : undefined}>
      <Glyph name={glyphOf[edge]} />
      <span className="word">{label}</span>
    </span>
  );
}

/** The edge alone, at the start of a line whose mark is bare. */
export function Edge({ edge }: { edge: EdgeName }) {
  return <span className="edge" data-edge={edge} aria-hidden="true" />;
}
