/*
 * Which dots of a band's area carry ink. Two uses: the black-and-white patterns of a print, and the hatch that lets
 * a column fade as the sounding under it grows old. x and y count in CSS pixels from the corner of the field.
 */

const diagonal = (x, y, step, width) => (((x + y) % step) + step) % step < width;
const counter = (x, y, step, width) => (((x - y) % step) + step) % step < width;
const dot = (x, y, step, size) => {
  const row = Math.floor(y / step);
  const across = x + (row % 2 ? step / 2 : 0);
  return across - Math.floor(across / step) * step < size && y - row * step < size;
};

/** The patterns of the print, in the order of the quarter-scale's bands, quiet first; the last two are solid. */
const PRINTED = [
  () => false,
  (x, y) => dot(x, y, 9, 1.3),
  (x, y) => dot(x, y, 5, 1.3),
  (x, y) => diagonal(x, y, 11, 1.1),
  (x, y) => diagonal(x, y, 5, 1.1),
  (x, y) => diagonal(x, y, 5, 1.3) || counter(x, y, 5, 1.3),
  () => true,
  () => true,
];

/** Whether the printed pattern of band `band` has ink at (x, y). */
export const printed = (band, x, y) => PRINTED[band](x, y);

/** The cross-ticks that mark overturned air inside its solid colour. */
export function overturnedTick(x, y) {
  const u = ((x % 10) + 10) % 10 - 5;
  const v = ((y % 10) + 10) % 10 - 5;
  return Math.abs(u) < 3.5 && Math.abs(v) < 3.5 && (Math.abs(u - v) < 0.9 || Math.abs(u + v) < 0.9);
}

const STEP = 8;

/**
 * Whether a column carried forward still shows ink at (x, y). `age` runs from 0, just left, to 1, at the end of its
 * time: the share of dots with ink falls evenly from three quarters to one eighth.
 */
export function carried(age, x, y) {
  const share = 0.75 - 0.625 * Math.min(1, Math.max(0, age));
  // against the slant of the printed bands, or the two would cancel each other
  return counter(x, y, STEP, share * STEP);
}

/** The sparse dots of a sounding that could not be analysed. */
export const sparseDots = (x, y) => dot(x, y, 9, 1.3);
