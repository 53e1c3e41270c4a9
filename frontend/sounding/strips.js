/*
 * Geometry of the strips: everything stands on one height axis in metres, flight levels are put on it through the
 * sounding's own pairs of height and level, never through a constant. No DOM; tested in node.
 */
import { BANDS, bandOf, quarterScale } from '../shared/lib/quarter-scale.js';
import { isNumber } from '../shared/lib/units.js';

/** A straight map from [from, until] onto [start, end]. */
export function scale(from, until, start, end) {
  const width = until - from;
  return value => start + (width === 0 ? 0 : (value - from) / width) * (end - start);
}

/** Heights of whole flight levels, every `step`: `[{flightLevel, heightM}]`, between pairs of {heightM, flightLevel} that rise. */
export function flightLevelMarks(points, step) {
  const pairs = points.filter(p => isNumber(p.heightM) && isNumber(p.flightLevel)).sort((a, b) => a.heightM - b.heightM);
  const marks = [];
  for (let k = 1; k < pairs.length; k++) {
    const below = pairs[k - 1];
    const above = pairs[k];
    if (!(above.flightLevel > below.flightLevel)) continue;
    for (let level = Math.ceil(below.flightLevel / step) * step; level <= above.flightLevel; level += step) {
      if (marks.length > 0 && marks[marks.length - 1].flightLevel >= level) continue;
      const weight = (level - below.flightLevel) / (above.flightLevel - below.flightLevel);
      marks.push({ flightLevel: level, heightM: below.heightM + weight * (above.heightM - below.heightM) });
    }
  }
  return marks;
}

/** Unbroken runs of `[value, height]`; a missing value ends a run, so that a gap in the data is a gap in the line. */
export function runs(points, value, height = point => point.heightM) {
  const found = [];
  let open = null;
  for (const point of points) {
    const v = value(point);
    const h = height(point);
    if (isNumber(v) && isNumber(h)) {
      if (open === null) found.push(open = []);
      open.push([v, h]);
    } else {
      open = null;
    }
  }
  return found;
}

/**
 * Runs through the points that have a value: levels reported for another quantity lie between them and break nothing,
 * but between two levels that bound a gap nothing was measured.
 */
export function measuredRuns(points, value, gapFlag) {
  const found = [];
  let last = null;
  for (const point of points.filter(p => isNumber(value(p)) && isNumber(p.heightM))) {
    const gap = last !== null && last.flags?.includes(gapFlag) && point.flags?.includes(gapFlag);
    if (last === null || gap) found.push([]);
    found[found.length - 1].push([value(point), point.heightM]);
    last = point;
  }
  return found;
}

/** The text of an SVG path through runs. A run of one point is a short dash, so that it is seen. */
export function pathOf(lines, x, y) {
  return lines.map(line => (line.length === 1
    ? `M${coordinate(x(line[0][0]) - 1)} ${coordinate(y(line[0][1]))}h2`
    : line.map(([v, h], k) => `${k === 0 ? 'M' : 'L'}${coordinate(x(v))} ${coordinate(y(h))}`).join(''))).join('');
}

const coordinate = value => String(Math.round(value * 10) / 10);

/**
 * Stretches of the height axis by the band their Richardson number lies in: `[{band, baseM, topM}]`, `band` an index
 * into BANDS. Each point of the grid stands for the stretch half-way to its neighbours. Overturned air is a band of
 * its own; where there is no number nothing is drawn.
 */
export function bandStretches(profile) {
  const stretches = [];
  for (let k = 0; k < profile.length; k++) {
    const point = profile[k];
    const band = point.flags?.includes('OVERTURNED') ? BANDS.length - 1 : bandOf(point.richardson);
    if (band < 0) continue;
    const baseM = k === 0 ? point.heightM : (profile[k - 1].heightM + point.heightM) / 2;
    const topM = k === profile.length - 1 ? point.heightM : (point.heightM + profile[k + 1].heightM) / 2;
    const last = stretches[stretches.length - 1];
    if (last && last.band === band && last.topM === baseM) last.topM = topM;
    else stretches.push({ band, baseM, topM });
  }
  return stretches;
}

/** Place of a Richardson number on the quarter-scale; null for negative and missing ones. */
export const onQuarterScale = point => quarterScale(point.richardson);

/** Round ends for an axis: `{from, until, step}` with at most `most` steps. */
export function axis(values, most = 4) {
  const numbers = values.filter(isNumber);
  if (numbers.length === 0) return { from: 0, until: 1, step: 1 };
  const low = extreme(numbers, 0);
  const high = extreme(numbers, 1);
  const raw = (high - low || 1) / most;
  const power = 10 ** Math.floor(Math.log10(raw));
  const step = [1, 2, 5, 10].map(factor => factor * power).find(candidate => candidate >= raw * (1 - 1e-9));
  const from = Math.floor(low / step + 1e-9) * step;
  let until = Math.ceil(high / step - 1e-9) * step;
  if (until === from) until = from + step;
  return { from, until, step };
}

/** The smallest (0) or greatest (1); not by spreading, which thousands of levels would overflow. */
function extreme(numbers, which) {
  return numbers.reduce((a, b) => (which === 0 ? Math.min(a, b) : Math.max(a, b)));
}

/** Ticks of an axis, ends included. */
export function ticks({ from, until, step }) {
  const found = [];
  for (let k = 0; from + k * step <= until + step * 1e-9; k++) found.push(Math.round((from + k * step) / step) * step);
  return found;
}

/** Every `stepM` from the lowest to the highest, one of the levels nearest to it: for the arrows of direction. */
export function every(levels, stepM) {
  const placed = levels.filter(level => isNumber(level.heightM) && isNumber(level.windFromDeg)).sort((a, b) => a.heightM - b.heightM);
  const chosen = [];
  for (const level of placed) {
    if (chosen.length === 0 || level.heightM - chosen[chosen.length - 1].heightM >= stepM) chosen.push(level);
  }
  return chosen;
}
