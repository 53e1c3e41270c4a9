/*
 * A sounding as a column of the display: at every level the minute the balloon was there. The arrays are those of the
 * answer of /api/v1/time-height; flight level rises strictly, a value of null was not observed.
 */
import { epochMinute } from '../shared/lib/utc.js';
import { CRITICAL, quarterScale } from '../shared/lib/quarter-scale.js';

/** Half the width of a solid column in minutes: it stands for half an hour before and after the balloon passed. */
export const HALF_WIDTH_MIN = 30;
const RISE_FL_PER_MIN = 5 * 60 / 30.48;

/**
 * The quarter-scale carried on below zero with the slope it has there, so that it rises strictly over all Ri and
 * straight lines between levels are straight lines in it.
 */
export function signedQuarterScale(richardson) {
  if (typeof richardson !== 'number' || Number.isNaN(richardson)) return NaN;
  return richardson < 0 ? richardson / CRITICAL : quarterScale(richardson);
}

/** Back from the signed scale to Ri. */
export function richardsonOfSigned(q) {
  if (q < 0) return q * CRITICAL;
  return q >= 1 ? Infinity : CRITICAL * q / (1 - q);
}

/** The columns in the order of time, with moments as epoch minutes; the next column ends the one before it. */
export function prepareColumns(columns) {
  const prepared = columns.map(column => {
    const launchedMinute = epochMinute(column.launchedAt ?? column.nominalAt);
    const levels = column.levels ?? {};
    const flightLevel = levels.flightLevel ?? [];
    const analysed = !column.notAnalysed && flightLevel.length > 1;
    return {
      ...column,
      analysed,
      launchedMinute,
      nominalMinute: epochMinute(column.nominalAt),
      carriedUntilMinute: epochMinute(column.carriedUntil),
      flightLevel: analysed ? flightLevel : [0, 450],
      minute: analysed ? levels.minute : [launchedMinute, launchedMinute + 450 / RISE_FL_PER_MIN],
      heightM: analysed ? levels.heightM : [],
      richardson: analysed ? levels.richardson : [],
      signed: analysed ? levels.richardson.map(signedQuarterScale) : [],
      shearKtPer1000Ft: analysed ? levels.shearKtPer1000Ft : [],
      n2PerS2: analysed ? levels.n2PerS2 : [],
      probability: analysed ? levels.probabilityRichardsonBelowQuarter ?? [] : [],
    };
  });
  prepared.sort((a, b) => a.launchedMinute - b.launchedMinute);
  prepared.forEach((column, index) => { column.next = prepared[index + 1] ?? null; });
  return prepared;
}

/** Index of the last level at or below `level`, −1 below the first. */
export function levelIndex(column, level) {
  const levels = column.flightLevel;
  let low = -1;
  let high = levels.length;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (levels[middle] <= level) low = middle; else high = middle;
  }
  return low;
}

/** Straight-line value of one of the column's arrays at a flight level; null outside it or beside a missing value. */
export function valueAt(column, values, level) {
  const index = levelIndex(column, level);
  if (index < 0 || values.length === 0) return null;
  const levels = column.flightLevel;
  if (levels[index] === level) return present(values[index]);
  if (index === levels.length - 1) return null;
  const below = present(values[index]);
  const above = present(values[index + 1]);
  if (below === null || above === null) return null;
  return below + (above - below) * (level - levels[index]) / (levels[index + 1] - levels[index]);
}

const present = value => (typeof value === 'number' && Number.isFinite(value) ? value : null);

/** Ri at a flight level, along the quarter-scale between levels; null where nothing was observed. */
export function richardsonAt(column, level) {
  const q = valueAt(column, column.signed, level);
  return q === null ? null : richardsonOfSigned(q);
}

export const minuteAt = (column, level) => valueAt(column, column.minute, level);

/** Where the column is solid and how far it is carried at one level: `{start, end, until}` in minutes, or null. */
export function extentAt(column, level) {
  const passed = minuteAt(column, level);
  if (passed === null) return null;
  const end = passed + HALF_WIDTH_MIN;
  let until = Math.max(end, column.carriedUntilMinute);
  if (column.next) {
    const next = minuteAt(column.next, level);
    // where the next balloon did not reach this level, nothing newer is known and the old column goes on
    if (next !== null) until = Math.min(until, Math.max(passed, next - HALF_WIDTH_MIN));
  }
  return { start: passed - HALF_WIDTH_MIN, end: Math.min(end, until), until };
}

/**
 * What the display shows at one point: `{column, kind, ageMin}` with kind `solid` or `carried`, or null where nothing
 * is known. The newest column that covers the point wins.
 */
export function columnAt(columns, minute, level) {
  for (let index = columns.length - 1; index >= 0; index--) {
    const extent = extentAt(columns[index], level);
    if (!extent || minute < extent.start || minute > extent.until) continue;
    return {
      column: columns[index],
      kind: minute <= extent.end ? 'solid' : 'carried',
      ageMin: minute - minuteAt(columns[index], level),
    };
  }
  return null;
}

/** Flight levels where the column's Ri crosses `threshold`, from below upward. */
export function crossings(column, threshold) {
  const at = signedQuarterScale(threshold);
  const found = [];
  for (let index = 0; index + 1 < column.signed.length; index++) {
    const below = column.signed[index] - at;
    const above = column.signed[index + 1] - at;
    if (Number.isNaN(below) || Number.isNaN(above) || (below < 0) === (above < 0)) continue;
    const share = below / (below - above);
    found.push(column.flightLevel[index] + share * (column.flightLevel[index + 1] - column.flightLevel[index]));
  }
  return found;
}

/** Pairs `{flightLevel, heightM}` at which the column passes each whole `stepKm`, for the km axis. */
export function kilometreTicks(column, stepKm) {
  const ticks = [];
  const heights = column.heightM;
  for (let index = 0; index + 1 < heights.length; index++) {
    const from = Math.ceil(heights[index] / 1000 / stepKm);
    for (let step = from; step * stepKm * 1000 < heights[index + 1]; step++) {
      const share = (step * stepKm * 1000 - heights[index]) / (heights[index + 1] - heights[index]);
      ticks.push({
        km: step * stepKm,
        flightLevel: column.flightLevel[index] + share * (column.flightLevel[index + 1] - column.flightLevel[index]),
      });
    }
  }
  return ticks;
}
