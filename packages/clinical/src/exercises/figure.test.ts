import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { drawMovement, drawStart } from "./draw-figure";
import { floorAt, placeJoints, skeleton } from "./figure";
import { crookLying, lieOnBack, pose, side, sit, stand } from "./pose";

const angle = fc.integer({ min: -170, max: 170 });
const anyPose = fc
  .record({
    trunk: angle,
    hip: fc.tuple(angle, angle),
    knee: fc.tuple(angle, angle),
    shoulder: fc.tuple(angle, angle),
  })
  .map((change) => pose(stand, change));

const length = (a: { x: number; y: number }, b: { x: number; y: number }) => Math.hypot(a.x - b.x, a.y - b.y);

describe("placing the joints", () => {
  it("never stretches a limb, in any pose and view", () => {
    fc.assert(
      fc.property(anyPose, fc.constantFrom("side", "front"), (p, view) => {
        const body = placeJoints(p, view as "side" | "front");
        for (const limb of ["near", "far"] as const) {
          expect(length(body[`${limb}-hip`], body[`${limb}-knee`])).toBeCloseTo(skeleton.thigh, 6);
          expect(length(body[`${limb}-knee`], body[`${limb}-ankle`])).toBeCloseTo(skeleton.shank, 6);
          expect(length(body[`${limb}-shoulder`], body[`${limb}-elbow`])).toBeCloseTo(skeleton.upperArm, 6);
        }
        expect(length(body.pelvis, body.shoulder)).toBeCloseTo(skeleton.trunk, 6);
      }),
    );
  });

  it("rests on the floor and never under it", () => {
    fc.assert(
      fc.property(anyPose, (p) => {
        const lowest = Math.max(...Object.values(placeJoints(p, "side")).map((point) => point.y));
        expect(lowest).toBeCloseTo(floorAt - 2, 6);
      }),
    );
  });

  it("stands upright, sits with level thighs, lies flat", () => {
    const standing = placeJoints(stand, "side");
    expect(standing.head.y).toBeLessThan(standing.pelvis.y);
    expect(standing.pelvis.x).toBeCloseTo(standing["near-ankle"].x, 6);
    const sitting = placeJoints(sit, "side");
    expect(sitting["near-knee"].y).toBeCloseTo(sitting.pelvis.y, 6);
    expect(sitting["near-knee"].x).toBeGreaterThan(sitting.pelvis.x);
    const lying = placeJoints(lieOnBack, "side");
    expect(lying.head.y).toBeCloseTo(lying.pelvis.y, 6);
    const crook = placeJoints(crookLying, "side");
    expect(crook["near-knee"].y).toBeLessThan(crook.pelvis.y - 15);
  });
});

describe("drawing", () => {
  const figure = side(sit, stand, "shoulder");

  it("draws the start alone without ghost or arc", () => {
    const drawing = drawStart(figure);
    expect(drawing.ghost).toEqual([]);
    expect(drawing.arc).toBeNull();
  });

  it("draws the movement over a ghost, with one arc", () => {
    const drawing = drawMovement(figure);
    expect(drawing.ghost.length).toBe(5);
    expect(drawing.arc?.d).toMatch(/^M[\d. -]+Q[\d. -]+$/);
  });

  it("has no arc for a hold", () => {
    expect(drawMovement(side(stand, stand, null)).arc).toBeNull();
    expect(drawMovement(side(stand, stand, "head")).arc).toBeNull();
  });

  it("widens its square where a limb leaves the page", () => {
    expect(drawStart(figure).box).toEqual({ x: 0, y: 0, size: 120 });
    const wide = drawStart(side(pose(lieOnBack, { shoulder: [180, 180] }), lieOnBack, null));
    expect(wide.box.size).toBeGreaterThan(120);
    expect(wide.box.y).toBe(120 - wide.box.size);
  });
});
