/*
 * The quarter-scale for the Richardson number, q = Ri / (Ri + 0.25) for Ri ≥ 0: zero is finite, the critical value
 * 0.25 lies exactly in the middle, and everything quiet is pressed to one side. Ri < 0 has no place on it and is
 * drawn as a band of its own. Ticks carry Ri, never q.
 */
export const CRITICAL = 0.25;

/** q between 0 and 1; 1 for infinity, null for negative and missing values. */
export function quarterScale(richardson) {
  if (typeof richardson !== 'number' || Number.isNaN(richardson) || richardson < 0) return null;
  return richardson === Infinity ? 1 : richardson / (richardson + CRITICAL);
}

/** The inverse: Ri for q between 0 and 1. */
export function richardsonOf(q) {
  if (!(q >= 0 && q <= 1)) throw new RangeError(`q must be between 0 and 1, not ${q}`);
  return q === 1 ? Infinity : CRITICAL * q / (1 - q);
}

export const TICKS = Object.freeze([0, 0.1, 0.25, 0.5, 1, 2, 5].map(richardson =>
  Object.freeze({ richardson, q: quarterScale(richardson), label: String(richardson) })));

/** The bands the field is filled with, quiet first; `token` is the custom property that holds the colour. */
export const BANDS = Object.freeze([
  { from: 5, until: Infinity, token: '--ri-5', label: '≥ 5' },
  { from: 2, until: 5, token: '--ri-2', label: '2 to 5' },
  { from: 1, until: 2, token: '--ri-1', label: '1 to 2' },
  { from: 0.5, until: 1, token: '--ri-half', label: '0.5 to 1' },
  { from: 0.25, until: 0.5, token: '--ri-quarter', label: '0.25 to 0.5' },
  { from: 0.1, until: 0.25, token: '--ri-tenth', label: '0.1 to 0.25' },
  { from: 0, until: 0.1, token: '--ri-0', label: '0 to 0.1' },
  { from: -Infinity, until: 0, token: '--ri-overturned', label: '< 0' },
].map(Object.freeze));

/** Index into BANDS, or -1 where there is no number. A value on an edge belongs to the quieter band. */
export function bandOf(richardson) {
  if (typeof richardson !== 'number' || Number.isNaN(richardson)) return -1;
  return BANDS.findIndex(band => richardson >= band.from && (richardson < band.until || band.until === Infinity));
}
