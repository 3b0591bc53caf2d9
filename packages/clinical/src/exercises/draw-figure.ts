import { drawingSize, floorAt, type Point, type Posed, placeJoints, skeleton } from "./figure";
import type { Figure, Joint, Pose, Prop } from "./pose";

/** One line of ink: SVG path data (also understood by PDF writers) and its thickness in drawing units. */
export interface Stroke {
  readonly d: string;
  readonly width: number;
}

export interface Circle {
  readonly x: number;
  readonly y: number;
  readonly r: number;
}

/** Layers, in the order they are drawn. */
export interface FigureDrawing {
  /** The square that holds everything: 0, 0, 120 unless the body reaches further. */
  readonly box: { readonly x: number; readonly y: number; readonly size: number };
  readonly props: readonly Stroke[];
  /** The starting position, to be dotted; empty in a drawing of the start alone. */
  readonly ghost: readonly Stroke[];
  readonly ghostHead: Circle | null;
  readonly far: readonly Stroke[];
  readonly near: readonly Stroke[];
  readonly head: Circle;
  readonly nearArm: Stroke;
  readonly arc: { readonly d: string; readonly head: string } | null;
}

/** One decimal place: engines differ in the last digit of a sine, and server and browser must draw the same. */
const rounded = (value: number) => Math.round(value * 10) / 10;
const show = (value: number) => String(rounded(value));
const circle = (p: Point): Circle => ({ x: rounded(p.x), y: rounded(p.y), r: skeleton.headRadius });
const at = (p: Point) => `${show(p.x)} ${show(p.y)}`;
const line = (...points: Point[]) => points.map((p, i) => `${i === 0 ? "M" : "L"}${at(p)}`).join("");

/** The trunk as a curve: the middle of the back moves sideways by the bend of the spine. */
function trunk(body: Posed, pose: Pose): string {
  const { pelvis, shoulder } = body;
  const bend = 2 + pose.round * 0.22;
  const dx = shoulder.x - pelvis.x;
  const dy = shoulder.y - pelvis.y;
  const length = Math.hypot(dx, dy) || 1;
  const middle = {
    x: (pelvis.x + shoulder.x) / 2 + (dy / length) * bend,
    y: (pelvis.y + shoulder.y) / 2 - (dx / length) * bend,
  };
  return `M${at(pelvis)}Q${at(middle)} ${at(shoulder)}`;
}

function legStrokes(body: Posed, which: "near" | "far", widths: readonly [number, number, number]): Stroke[] {
  const hip = body[`${which}-hip`];
  const knee = body[`${which}-knee`];
  const ankle = body[`${which}-ankle`];
  return [
    { d: line(hip, knee), width: widths[0] },
    { d: line(knee, ankle), width: widths[1] },
    { d: line(ankle, body[`${which}-toe`]), width: widths[2] },
  ];
}

const armLine = (body: Posed, which: "near" | "far") =>
  line(body[`${which}-shoulder`], body[`${which}-elbow`], body[`${which}-hand`]);

function girdles(body: Posed, view: Figure["view"]): Stroke[] {
  if (view === "side") return [];
  return [
    { d: line(body["near-shoulder"], body["far-shoulder"]), width: 4 },
    { d: line(body["near-hip"], body["far-hip"]), width: 5 },
  ];
}

function ghostStrokes(figure: Figure): { strokes: Stroke[]; head: Circle } {
  const body = placeJoints(figure.start, figure.view);
  const paths = [
    trunk(body, figure.start),
    ...(["near", "far"] as const).flatMap((which) => [
      line(body[`${which}-hip`], body[`${which}-knee`], body[`${which}-ankle`], body[`${which}-toe`]),
      armLine(body, which),
    ]),
  ];
  return {
    strokes: paths.map((d) => ({ d, width: 1.3 })),
    head: circle(body.head),
  };
}

/** The path of one joint from start to end, bowed away from the straight line, with an open arrow head. */
function arc(figure: Figure, joint: Joint): FigureDrawing["arc"] {
  const from = placeJoints(figure.start, figure.view)[joint];
  const to = placeJoints(figure.end, figure.view)[joint];
  const dx = to.x - from.x;
  const dy = to.y - from.y;
  const length = Math.hypot(dx, dy);
  if (length < 4) return null;
  const middleOfBody = placeJoints(figure.end, figure.view).pelvis;
  const mid = { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 };
  const outward = (mid.x - middleOfBody.x) * dy - (mid.y - middleOfBody.y) * dx >= 0 ? 1 : -1;
  const bow = Math.min(10, length * 0.22) * outward;
  const control = { x: mid.x + (dy / length) * bow, y: mid.y - (dx / length) * bow };
  const angle = Math.atan2(to.y - control.y, to.x - control.x);
  const barb = (turn: number): Point => ({
    x: to.x - Math.cos(angle + turn) * 4.5,
    y: to.y - Math.sin(angle + turn) * 4.5,
  });
  return { d: `M${at(from)}Q${at(control)} ${at(to)}`, head: line(barb(0.55), to, barb(-0.55)) };
}

const propPaths: Record<Prop["kind"], (x: number) => string> = {
  chair: (x) => `M${x} 56V115M${x} 91h26V115`,
  stool: (x) => `M${x - 4} 91h32M${x} 91V115M${x + 24} 91V115`,
  step: (x) => `M${x} 115V101H${x + 40}V115`,
  worktop: (x) => `M${x} 66h24M${x + 4} 66V115`,
  wall: (x) => `M${x} 14V115`,
  bed: (x) => `M${x} 91H${x + 70}M${x + 4} 91V115M${x + 66} 91V115`,
  ball: (x) => `M${x - 7} 108a7 7 0 1 0 14 0a7 7 0 1 0 -14 0`,
  cushion: (x) => `M${x} 115q-3 -4 0 -8h22q3 4 0 8z`,
  stick: (x) => `M${x} 40V115`,
  rail: (x) => `M${x} 62V115M${x} 62h5`,
};

/** A square standing on the same floor line, widened where a limb reaches past the page. */
function boxOf(figure: Figure): FigureDrawing["box"] {
  const points = [figure.start, figure.end].flatMap((pose) => Object.values(placeJoints(pose, figure.view)));
  const left = Math.min(0, ...points.map((p) => p.x - 8));
  const right = Math.max(drawingSize, ...points.map((p) => p.x + 8));
  const top = Math.min(0, ...points.map((p) => p.y - 8));
  const size = Math.round(Math.max(right - left, drawingSize - top));
  return { x: Math.round((left + right - size) / 2), y: drawingSize - size, size };
}

function propStrokes(figure: Figure): Stroke[] {
  const { x, size } = boxOf(figure);
  const d =
    figure.view === "above"
      ? `M${x + 14} 4H${x + size - 14}V${floorAt + 1}H${x + 14}Z`
      : `M${x + 4} ${floorAt + 0.5}H${x + size - 4}`;
  const floor = { d, width: 1 };
  return [floor, ...figure.props.map(({ kind, x }) => ({ d: propPaths[kind](x), width: 1.4 }))];
}

function bodyLayers(pose: Pose, view: Figure["view"]) {
  const body = placeJoints(pose, view);
  return {
    far: [...legStrokes(body, "far", [5, 4, 3.2]), { d: armLine(body, "far"), width: 3.2 }],
    near: [
      { d: trunk(body, pose), width: 7.4 },
      ...girdles(body, view),
      ...legStrokes(body, "near", [5.6, 4.3, 3.4]),
      { d: line(body.shoulder, body.neck), width: 3.6 },
    ],
    head: circle(body.head),
    nearArm: { d: armLine(body, "near"), width: 3.5 },
  };
}

/** The starting position alone, in ink. */
export function drawStart(figure: Figure): FigureDrawing {
  return {
    box: boxOf(figure),
    props: propStrokes(figure),
    ghost: [],
    ghostHead: null,
    ...bodyLayers(figure.start, figure.view),
    arc: null,
  };
}

/** The end in ink over the dotted start, with one arc for the movement. */
export function drawMovement(figure: Figure): FigureDrawing {
  const ghost = ghostStrokes(figure);
  return {
    box: boxOf(figure),
    props: propStrokes(figure),
    ghost: ghost.strokes,
    ghostHead: ghost.head,
    ...bodyLayers(figure.end, figure.view),
    arc: figure.moves === null ? null : arc(figure, figure.moves),
  };
}
