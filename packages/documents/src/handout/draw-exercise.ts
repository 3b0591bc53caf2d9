import type { FigureDrawing, Stroke } from "@withy/clinical/exercises/draw-figure";
import { ink } from "../pdf/page-style";

const far = "#A5A594";
const movement = "#9B1C2E";

/** Draws one exercise figure into a square of `size` points whose top left corner is (x, y). */
export function drawExercise(
  doc: PDFKit.PDFDocument,
  drawing: FigureDrawing,
  x: number,
  y: number,
  size: number,
): void {
  const scale = size / drawing.box.size;
  const strokes = (list: readonly Stroke[], color: string) => {
    for (const { d, width } of list) doc.path(d).lineWidth(width).strokeColor(color).stroke();
  };
  doc.save();
  doc.translate(x, y).scale(scale).translate(-drawing.box.x, -drawing.box.y);
  doc.lineCap("round").lineJoin("round");
  strokes(drawing.props, ink.rule);
  doc.dash(2, { space: 2.6 });
  strokes(drawing.ghost, ink.soft);
  if (drawing.ghostHead) {
    const { x: cx, y: cy, r } = drawing.ghostHead;
    doc.lineWidth(1.3).circle(cx, cy, r).stroke(ink.soft);
  }
  doc.undash();
  strokes(drawing.far, far);
  strokes(drawing.near, ink.text);
  doc.circle(drawing.head.x, drawing.head.y, drawing.head.r).fill(ink.text);
  // A white edge parts the near arm from the trunk behind it.
  strokes([{ d: drawing.nearArm.d, width: drawing.nearArm.width + 2 }], "#FFFFFF");
  strokes([drawing.nearArm], ink.text);
  if (drawing.arc)
    strokes(
      [
        { d: drawing.arc.d, width: 1.7 },
        { d: drawing.arc.head, width: 1.7 },
      ],
      movement,
    );
  doc.restore();
}
