import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cellOf, roundElevation } from '@/lib/orchards/cell';

/** Coordinates as they are stored: whole microdegrees, with borders and poles often among them. */
const degrees = (most: number) =>
  fc.oneof(
    fc.integer({ min: -most * 1e6, max: most * 1e6 }).map((micro) => micro / 1e6),
    fc.integer({ min: -most * 10, max: most * 10 }).map((tenth) => tenth / 10),
    fc.constantFrom(-most, most, 0, -0),
  );

const micro = (value: number) => Math.round(value * 1e6);

describe('the cell that others see in place of a point', () => {
  it.each([
    // latitude, longitude, centre
    [12.3456, -45.6789, 12.35, -45.65],
    [64.1, 64.1, 64.15, 64.15],
    [-64.1, -64.1, -64.05, -64.05],
    [-64.100001, 0.099999, -64.15, 0.05],
    [0.3, 0.7, 0.35, 0.75],
    [-0.3, -0.7, -0.25, -0.65],
    [0, 0, 0.05, 0.05],
    [-0, -0, 0.05, 0.05],
    [-0.000001, -0.000001, -0.05, -0.05],
    [90, 180, 89.95, 179.95],
    [-90, -180, -89.95, -179.95],
    [89.999999, 179.999999, 89.95, 179.95],
    [-89.999999, -179.999999, -89.95, -179.95],
    [1.1, 2.2, 1.15, 2.25],
    [4.35, 8.2, 4.35, 8.25],
  ])('of %d, %d is around %d, %d', (latitude, longitude, centreLatitude, centreLongitude) => {
    expect(cellOf(latitude, longitude)).toEqual({ latitude: centreLatitude, longitude: centreLongitude });
  });

  it('holds the point, to the microdegree', () => {
    fc.assert(
      fc.property(degrees(90), degrees(180), (latitude, longitude) => {
        const cell = cellOf(latitude, longitude);
        for (const [point, centre, most] of [
          [latitude, cell.latitude, 90],
          [longitude, cell.longitude, 180],
        ] as const) {
          const low = micro(centre) - 50_000;
          const isLast = low + 100_000 === most * 1e6;
          expect(micro(point)).toBeGreaterThanOrEqual(low);
          if (isLast) expect(micro(point)).toBeLessThanOrEqual(low + 100_000);
          else expect(micro(point)).toBeLessThan(low + 100_000);
        }
      }),
    );
  });

  it('lies on the grid and on the globe, with two decimals', () => {
    fc.assert(
      fc.property(degrees(90), degrees(180), (latitude, longitude) => {
        const cell = cellOf(latitude, longitude);
        expect(Math.abs(cell.latitude)).toBeLessThan(90);
        expect(Math.abs(cell.longitude)).toBeLessThan(180);
        for (const centre of [cell.latitude, cell.longitude]) {
          expect(String(centre)).toMatch(/^-?\d+\.\d5$/);
        }
      }),
    );
  });

  it('is the same for every point in it, so that it tells nothing of where in it the orchard lies', () => {
    fc.assert(
      fc.property(degrees(90), degrees(180), (latitude, longitude) => {
        const cell = cellOf(latitude, longitude);
        expect(cellOf(cell.latitude, cell.longitude)).toEqual(cell);
      }),
    );
  });

  it.each([
    [90.000001, 0],
    [0, -180.000001],
    [Number.NaN, 0],
    [0, Number.POSITIVE_INFINITY],
  ])('does not exist for %d, %d', (latitude, longitude) => {
    expect(() => cellOf(latitude, longitude)).toThrow(RangeError);
  });
});

describe('the elevation that others see', () => {
  it.each([
    [420, 400],
    [450, 500],
    [449.9, 400],
    [0, 0],
    [-49, 0],
    [-120, -100],
    [-500, -500],
    [9000, 9000],
  ])('of %d m is %d m', (elevation, shown) => {
    expect(roundElevation(elevation)).toBe(shown);
  });
});
