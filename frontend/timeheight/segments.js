/* What is drawn over the field, worked out from the prepared columns: lines of equal Ri, outlines, reference lines. */
import { hhmmZ } from '../shared/lib/utc.js';
import { flightLevelText } from '../shared/lib/flight-level.js';
import { isNumber, knotsText } from '../shared/lib/units.js';
import { crossings, extentAt, minuteAt } from './columns.js';

const OUTLINE_STEP_FL = 10;

/** Segments of the lines Ri = 0.25 (critical) and Ri = 1, each over its column's solid and carried time. */
export function richardsonSegments(columns) {
  const segments = [];
  for (const column of columns) {
    for (const [threshold, critical] of [[1, false], [0.25, true]]) {
      for (const flightLevel of crossings(column, threshold)) {
        const extent = extentAt(column, flightLevel);
        if (!extent || extent.until <= extent.start) continue;
        segments.push({ flightLevel, from: extent.start, until: extent.end, carriedUntil: extent.until, critical });
      }
    }
  }
  return segments.sort((a, b) => Number(a.critical) - Number(b.critical));
}

/** Outline, balloon path and words of each column. */
export function columnNotesOf(columns, high) {
  return columns.map(column => {
    const bottom = Math.max(0, column.flightLevel[0]);
    const top = Math.min(high, column.flightLevel[column.flightLevel.length - 1]);
    const left = [];
    const right = [];
    const path = [];
    for (let level = bottom; level <= top; level += Math.max(0.5, Math.min(OUTLINE_STEP_FL, top - level || 1))) {
      const extent = extentAt(column, level);
      if (!extent) continue;
      left.push({ minute: extent.start, level });
      right.push({ minute: extent.end, level });
      path.push({ minute: Math.min(minuteAt(column, level), extent.end), level });
    }
    const foot = extentAt(column, bottom);
    return {
      left, right, path,
      carriedFrom: foot ? foot.end : column.launchedMinute,
      carriedUntil: foot ? foot.until : column.launchedMinute,
      carried: column.analysed ? `carried from ${hhmmZ(column.nominalMinute * 60000)}` : '',
      problem: column.analysed ? '' : `not analysed: ${column.notAnalysed ?? 'fewer than two levels'}`,
    };
  }).filter(note => note.path.length > 0);
}

/** Tropopause and highest wind of each column, over the time the column stands for. */
export function referencesOf(columns) {
  const lines = [];
  for (const column of columns) {
    const add = (flightLevel, kind, text, open) => {
      if (!isNumber(flightLevel)) return;
      const extent = extentAt(column, flightLevel) ?? {
        start: column.launchedMinute, until: column.carriedUntilMinute,
      };
      if (extent.until > extent.start) lines.push({ from: extent.start, until: extent.until, flightLevel, kind, text, open });
    };
    add(column.tropopauseFlightLevel, 'tropopause', `TROP ${flightLevelText(column.tropopauseFlightLevel)}`, false);
    if (isNumber(column.maxWindKt)) {
      const open = column.maxWindAtTopOfData === true;
      add(column.maxWindFlightLevel, 'jet',
        `J ${knotsText(column.maxWindKt)} ${flightLevelText(column.maxWindFlightLevel)}${open ? ' may be higher' : ''}`, open);
    }
  }
  return lines;
}

/**
 * Boxes with moments as epoch minutes and their words. `stoodFrom` to `stoodUntil` is the part of its validity in
 * which a version was the one in force: from when it was filed until it was replaced.
 */
export function boxesOf(boxes, epochMinute) {
  return boxes.map(box => ({
    ...box,
    from: epochMinute(box.validFrom),
    until: epochMinute(box.validUntil),
    stoodFrom: Math.max(epochMinute(box.validFrom), epochMinute(box.filedAt)),
    stoodUntil: box.replacedAt ? Math.min(epochMinute(box.validUntil), epochMinute(box.replacedAt)) : epochMinute(box.validUntil),
    base: box.baseFlightLevel,
    top: box.topFlightLevel,
    label: `${box.label ?? `SLF ${box.number}`}${box.version > 1 ? ` v${box.version}` : ''}`,
    probability: isNumber(box.probabilityPercent) ? `${box.probabilityPercent} %` : '',
  }));
}

/** The versions that were in force at a moment and cover a level. */
export function boxesAt(boxes, minute, level) {
  return stoodBoxes(boxes).filter(box => minute >= box.stoodFrom && minute <= box.stoodUntil && level >= box.base && level <= box.top);
}

/** The versions that were in force for a time at all: neither cancellations nor what was replaced before it began. */
export const stoodBoxes = boxes => boxes.filter(box => !box.cancelled && box.stoodUntil > box.stoodFrom);
