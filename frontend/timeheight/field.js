/*
 * Paints the Ri field of all columns into one image, once for a view. A row of the image shows the lowest Ri anywhere
 * between its two edges, so that a layer thinner than a row is not lost.
 */
import { BANDS } from '../shared/lib/quarter-scale.js';
import { carried, overturnedTick, printed, sparseDots } from '../shared/charts/hatch.js';
import { extentAt, levelIndex, richardsonOfSigned, valueAt } from './columns.js';

const OVERTURNED = BANDS.length - 1;
// the bands' lower edges on the signed quarter-scale, quiet first; the last edge is open
const EDGES = BANDS.map(band => (band.from < 0 ? -Infinity : band.from / (band.from + 0.25)));

/**
 * @param columns prepared columns (columns.js)
 * @param view    `{from, until}` epoch minutes, `{low, high}` flight levels, `{width, height}` image points and
 *                `scale` points per CSS pixel
 * @param palette palette.js
 * @returns RGBA, four bytes a point, row 0 at the top
 */
export function paintField(columns, view, palette) {
  const { from, until, low, high, width, height, scale } = view;
  const image = new Uint8ClampedArray(width * height * 4);
  const perMinute = width / (until - from);
  for (const column of columns) {
    for (let row = 0; row < height; row++) {
      const level = high - (row + 0.5) * (high - low) / height;
      const extent = extentAt(column, level);
      if (!extent) continue;
      const half = (high - low) / height / 2;
      const band = column.analysed ? lowestBand(column, level - half, level + half) : null;
      if (column.analysed && band === null) continue;
      const first = Math.max(0, Math.round((extent.start - from) * perMinute));
      const solid = (extent.end - from) * perMinute;
      const last = Math.min(width - 1, Math.round((extent.until - from) * perMinute) - 1);
      for (let x = first; x <= last; x++) {
        const cssX = x / scale;
        const cssY = row / scale;
        const age = x < solid ? -1 : (x - solid) / Math.max(1, (column.carriedUntilMinute - extent.end) * perMinute);
        const ink = column.analysed ? bandInk(band, cssX, cssY, palette)
          : (sparseDots(cssX, cssY) && age < 0 ? rgbOfText(palette) : null);
        if (ink === null || (age >= 0 && !carried(age, cssX, cssY))) continue;
        const at = (row * width + x) * 4;
        image[at] = ink[0];
        image[at + 1] = ink[1];
        image[at + 2] = ink[2];
        image[at + 3] = 255;
      }
    }
  }
  return image;
}

/** Index of the band that holds the lowest Ri between two flight levels, or null where none was observed. */
export function lowestBand(column, lowLevel, highLevel) {
  let lowest = Infinity;
  for (const level of [lowLevel, highLevel, (lowLevel + highLevel) / 2]) {
    const q = valueAt(column, column.signed, level);
    if (q !== null && q < lowest) lowest = q;
  }
  for (let index = levelIndex(column, lowLevel) + 1; index < column.signed.length && column.flightLevel[index] <= highLevel; index++) {
    if (column.signed[index] < lowest) lowest = column.signed[index];
  }
  return lowest === Infinity ? null : EDGES.findIndex(edge => lowest >= edge);
}

/** Lowest Ri and its level in the whole column, `{richardson, flightLevel}`, or null. */
export function lowestRichardson(column) {
  let best = -1;
  column.signed.forEach((q, index) => {
    if (!Number.isNaN(q) && (best < 0 || q < column.signed[best])) best = index;
  });
  return best < 0 ? null : { richardson: richardsonOfSigned(column.signed[best]), flightLevel: column.flightLevel[best] };
}

function bandInk(band, x, y, palette) {
  if (palette.print) {
    if (!printed(band, x, y)) return null;
    return band === OVERTURNED && overturnedTick(x, y) ? palette.overturnedTick : palette.bands[band];
  }
  return band === OVERTURNED && overturnedTick(x, y) ? palette.overturnedTick : palette.bands[band];
}

const rgbOfText = palette => [1, 3, 5].map(at => parseInt(palette.text.slice(at, at + 2), 16));
