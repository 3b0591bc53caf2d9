import {
  drawMovement,
  drawStart,
  type FigureDrawing,
  type Stroke,
} from "@withy/clinical/exercises/draw-figure";
import type { Figure } from "@withy/clinical/exercises/pose";

function Strokes({ of, className }: { of: readonly Stroke[]; className: string }) {
  return (
    <g className={className}>
      {of.map((stroke, i) => (
        <path key={i} d={stroke.d} strokeWidth={stroke.width} />
      ))}
    </g>
  );
}

function Head({ of, className }: { of: FigureDrawing["head"]; className: string }) {
  return <circle className={className} cx={of.x} cy={of.y} r={of.r} />;
}

/**
 * One drawing of an exercise: the start alone, or the movement with the start dotted behind it. Words beside it say
 * the same, so it is hidden from readers unless it is given a title.
 */
export function ExerciseFigure({
  figure,
  of = "movement",
  size,
  title,
}: {
  figure: Figure;
  of?: "start" | "movement";
  size: number;
  title?: string;
}) {
  const drawing = of === "start" ? drawStart(figure) : drawMovement(figure);
  const { x, y, size: side } = drawing.box;
  const isNamed = title !== undefined;
  return (
    <svg
      className="exercise-figure"
      viewBox={`${x} ${y} ${side} ${side}`}
      width={size}
      height={size}
      role={isNamed ? "img" : undefined}
      aria-hidden={isNamed ? undefined : true}
      aria-label={title}
    >
      <Strokes of={drawing.props} className="figure-prop" />
      <Strokes of={drawing.ghost} className="figure-ghost" />
      {drawing.ghostHead && <Head of={drawing.ghostHead} className="figure-ghost" />}
      <Strokes of={drawing.far} className="figure-far" />
      <Strokes of={drawing.near} className="figure-near" />
      <Head of={drawing.head} className="figure-head" />
      <path className="figure-halo" d={drawing.nearArm.d} strokeWidth={drawing.nearArm.width + 2} />
      <Strokes of={[drawing.nearArm]} className="figure-near" />
      {drawing.arc && (
        <g className="figure-arc">
          <path d={drawing.arc.d} />
          <path d={drawing.arc.head} />
        </g>
      )}
    </svg>
  );
}
