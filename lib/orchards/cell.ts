/** The centre of a cell of 0.1 degree, in degrees. */
export type Cell = { latitude: number; longitude: number };

const MICRODEGREES = 1_000_000;
const CELL_MICRODEGREES = 100_000;

/**
 * What everyone but an orchard's members is shown of its place: the centre of the 0.1 degree cell that holds the point,
 * to two decimals. A point on a border belongs to the cell north or east of it; the pole and the 180th meridian belong to
 * the last cell before them.
 * @throws RangeError outside -90..90 and -180..180
 */
export function cellOf(latitude: number, longitude: number): Cell {
  return { latitude: centreOf(latitude, 90), longitude: centreOf(longitude, 180) };
}

/** Counted in whole microdegrees, as coordinates are stored: in floats 64.1 lies below the border that it stands on. */
function centreOf(degrees: number, most: number): number {
  if (!(Math.abs(degrees) <= most)) throw new RangeError(`${degrees} is not within ${most} degrees`);
  const cell = Math.floor(Math.round(degrees * MICRODEGREES) / CELL_MICRODEGREES);
  const clamped = Math.min(Math.max(cell, -most * 10), most * 10 - 1);
  return (clamped * 10 + 5) / 100;
}

/** An elevation to the nearest 100 m, as everyone but an orchard's members is shown it. */
export function roundElevation(elevationM: number): number {
  // Adding 0 turns -0 into 0.
  return Math.round(elevationM / 100) * 100 + 0;
}
