/** Shapes worked by hand: the projections of ASCE 7-16 Table 12.3-1 type 2 beyond a corner, over the plan dimension. */
import { describe, expect, it } from 'vitest';
import { planShape } from '../../src/inventory/plan-shape.js';
import type { Point } from '../../src/inventory/plan-shape.js';

const turned = (ring: readonly Point[], angle: number): readonly Point[] =>
  ring.map(([x, y]) => [x * Math.cos(angle) - y * Math.sin(angle), x * Math.sin(angle) + y * Math.cos(angle)]);
const L: readonly Point[] = [
  [0, 0],
  [40, 0],
  [40, 12],
  [16, 12],
  [16, 20],
  [0, 20],
];
const U: readonly Point[] = [
  [0, 0],
  [30, 0],
  [30, 20],
  [20, 20],
  [20, 8],
  [10, 8],
  [10, 20],
  [0, 20],
];

describe('planShape', () => {
  it('finds none in a rectangle, nor in a circle', () => {
    const box: readonly Point[] = [
      [0, 0],
      [30, 0],
      [30, 10],
      [0, 10],
    ];
    const circle = Array.from({ length: 40 }, (_, i): Point => [9 * Math.cos(i * 0.157), 9 * Math.sin(i * 0.157)]);
    for (const ring of [box, circle])
      expect(planShape(ring)).toMatchObject({ reentrant_projection: 0, reentrant_area_share: 0 });
  });

  it.each([0, 0.4, 1.7, 3])('takes the lesser projection beyond the corner of an L, turned by %d', (angle) => {
    for (const ring of [turned(L, angle), turned(L, angle).toReversed()]) {
      const found = planShape(ring)!;
      // beyond the corner 24 of 40 m and 8 of 20 m; hull: the triangle 24 × 8 / 2 over 608 m²
      expect(found.reentrant_projection).toBeCloseTo(0.4, 9);
      expect(found.reentrant_area_share).toBeCloseTo(96 / 608, 9);
      expect([found.length_m, found.width_m]).toEqual([expect.closeTo(40, 9), expect.closeTo(20, 9)]);
    }
  });

  it('takes the depth of the court of a U, and the area it leaves open', () => {
    const found = planShape(U)!;
    // 12 of 20 m deep; 20 of 30 m from the corner to the far side
    expect(found.reentrant_projection).toBeCloseTo(0.6, 9);
    expect(found.reentrant_area_share).toBeCloseTo(120 / 480, 9);
  });

  it('passes over a porch and a dent', () => {
    const porch: readonly Point[] = [
      [0, 0],
      [10, 0],
      [10, -1],
      [20, -1],
      [20, 0],
      [30, 0],
      [30, 10],
      [0, 10],
    ];
    expect(planShape(porch)!.reentrant_projection).toBeCloseTo(1 / 11, 9);
    const dent: readonly Point[] = [
      [0, 0],
      [15, 0.4],
      [30, 0],
      [30, 10],
      [0, 10],
    ];
    expect(planShape(dent)!.reentrant_projection).toBe(0);
  });
});
