import type { Figure, Joint, Pose } from "./pose";

export interface Point {
  readonly x: number;
  readonly y: number;
}

/** Lengths in drawing units; the whole drawing is 120 by 120, the floor at 115. */
export const skeleton = {
  trunk: 33,
  neck: 7,
  headRadius: 6.4,
  thigh: 27,
  shank: 25,
  foot: 8,
  upperArm: 16,
  forearm: 15,
  /** Half the breadth of hips and shoulders, shown only from the front. */
  halfHips: 5,
  halfShoulders: 8,
} as const;

export const drawingSize = 120;
export const floorAt = 115;
/** Half the thickness of the lowest limb, so that a foot rests on the line and not in it. */
const footRoom = 2;

export type Posed = Readonly<
  Record<Joint | "neck" | "near-hip" | "far-hip" | "near-shoulder" | "far-shoulder", Point>
>;

const toRadians = (degrees: number) => (degrees * Math.PI) / 180;

/** A point at a length along a direction: 0 degrees is straight down, 90 is to the right. */
function along(from: Point, degrees: number, length: number): Point {
  const r = toRadians(degrees);
  return { x: from.x + Math.sin(r) * length, y: from.y + Math.cos(r) * length };
}

function limb(
  from: Point,
  first: number,
  second: number,
  third: number,
  lengths: readonly [number, number, number],
) {
  const a = along(from, first, lengths[0]);
  const b = along(a, second, lengths[1]);
  return [a, b, along(b, third, lengths[2])] as const;
}

function leg(hip: Point, pose: Pose, view: Figure["view"], which: 0 | 1) {
  const sign = view !== "side" && which === 1 ? -1 : 1;
  const thigh = -pose.trunk + sign * pose.hip[which];
  const shank = thigh - sign * pose.knee[which];
  const foot = shank + sign * (90 + pose.ankle[which]);
  return limb(hip, thigh, shank, foot, [skeleton.thigh * pose.seen[which], skeleton.shank, skeleton.foot]);
}

function arm(shoulder: Point, pose: Pose, view: Figure["view"], which: 0 | 1) {
  const sign = view !== "side" && which === 1 ? -1 : 1;
  const upper = -pose.trunk + sign * pose.shoulder[which];
  const fore = upper + sign * pose.elbow[which];
  return limb(shoulder, upper, fore, fore, [skeleton.upperArm, skeleton.forearm, 0]);
}

function raw(pose: Pose, view: Figure["view"]): Posed {
  const pelvis = { x: 0, y: 0 };
  const shoulder = along(pelvis, 180 - pose.trunk, skeleton.trunk);
  const neck = along(shoulder, 180 - pose.trunk - pose.neck - pose.round * 0.5, skeleton.neck);
  const head = along(neck, 180 - pose.trunk - pose.neck - pose.round * 0.5, skeleton.headRadius * 0.87);
  const aside = (from: Point, by: number): Point =>
    view === "side" ? from : along(from, 90 - pose.trunk, by);
  const nearHip = aside(pelvis, skeleton.halfHips);
  const farHip = aside(pelvis, -skeleton.halfHips);
  const nearShoulder = aside(shoulder, skeleton.halfShoulders);
  const farShoulder = aside(shoulder, -skeleton.halfShoulders);
  const [nearKnee, nearAnkle, nearToe] = leg(nearHip, pose, view, 0);
  const [farKnee, farAnkle, farToe] = leg(farHip, pose, view, 1);
  const [nearElbow, nearHand] = arm(nearShoulder, pose, view, 0);
  const [farElbow, farHand] = arm(farShoulder, pose, view, 1);
  return {
    pelvis,
    shoulder,
    neck,
    head,
    "near-hip": nearHip,
    "far-hip": farHip,
    "near-shoulder": nearShoulder,
    "far-shoulder": farShoulder,
    "near-knee": nearKnee,
    "near-ankle": nearAnkle,
    "near-toe": nearToe,
    "far-knee": farKnee,
    "far-ankle": farAnkle,
    "far-toe": farToe,
    "near-elbow": nearElbow,
    "near-hand": nearHand,
    "far-elbow": farElbow,
    "far-hand": farHand,
  };
}

/**
 * Where every joint is, in drawing units (0 to 120, y downwards). The fixed joint stands at the
 * pose's x and height; without a height the lowest joint rests on the floor. Segment lengths never change.
 */
export function placeJoints(pose: Pose, view: Figure["view"]): Posed {
  const body = raw(pose, view);
  const lowest = Math.max(...Object.values(body).map((point) => point.y));
  const dx = pose.x - body[pose.fixed].x;
  const rests = pose.height === null ? lowest : body[pose.fixed].y + pose.height;
  const dy = floorAt - footRoom - rests;
  const moved = Object.entries(body).map(([name, p]) => [name, { x: p.x + dx, y: p.y + dy }]);
  return Object.fromEntries(moved) as Posed;
}
