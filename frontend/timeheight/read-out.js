/* The read-out of the cursor as a line for the eye and as a sentence for the ear. */
import { dayHhmmZ } from '../shared/lib/utc.js';
import { flightLevelText, levelDifferenceText, pressureOfFlightLevel } from '../shared/lib/flight-level.js';
import { intensityWord } from '../shared/lib/intensity.js';
import {
  fixed, isNumber, kilometresText, n2Text, pressureText, probabilityText, richardsonText, shearText,
} from '../shared/lib/units.js';
import { columnAt, richardsonAt, valueAt } from './columns.js';
import { nearestReport } from './reports.js';
import { boxesAt } from './segments.js';

/**
 * Everything known at a point: `{minute, level, column, kind, ageMin, heightM, richardson, shearKtPer1000Ft,
 * n2PerS2, probability, boxes, report}`, null where it is not known.
 */
export function valuesAt(display, minute, level) {
  const found = columnAt(display.columns, minute, level);
  const column = found?.column.analysed ? found.column : null;
  return {
    minute,
    level,
    column,
    kind: column ? found.kind : null,
    ageMin: column ? found.ageMin : null,
    heightM: column ? valueAt(column, column.heightM, level) : null,
    richardson: column ? richardsonAt(column, level) : null,
    shearKtPer1000Ft: column ? valueAt(column, column.shearKtPer1000Ft, level) : null,
    n2PerS2: column ? valueAt(column, column.n2PerS2, level) : null,
    probability: column ? valueAt(column, column.probability, level) : null,
    boxes: boxesAt(display.boxes, minute, level),
    report: nearestReport(display.reports, minute, level),
  };
}

/** The parts of the line, each a short text; the display puts rules between them. */
export function readOutParts(values, windowM) {
  const where = [isNumber(values.heightM) ? kilometresText(values.heightM) : null,
    pressureText(pressureOfFlightLevel(values.level))].filter(Boolean).join(', ');
  const parts = [`${dayHhmmZ(values.minute * 60000)} ${flightLevelText(values.level)} (${where})`];
  if (values.column) {
    parts.push(`Ri ${richardsonText(values.richardson)} ${fixed(windowM, 0)} m`);
    parts.push(`shear ${shearText(values.shearKtPer1000Ft)} kt/1000 ft`);
    parts.push(`N² ${n2Text(values.n2PerS2)}`);
    if (isNumber(values.probability)) parts.push(`P ${probabilityText(values.probability)}`);
    const from = dayHhmmZ(values.column.nominalMinute * 60000);
    parts.push(values.kind === 'carried' ? `carried from ${from}` : `sounding ${from}`);
  } else {
    parts.push('no sounding here');
  }
  parts.push(values.boxes.length ? values.boxes.map(box => `${box.label} inside`).join(', ') : 'no forecast');
  if (values.report) {
    const report = values.report;
    const minutes = Math.round(report.minute - values.minute);
    parts.push(`nearest report ${report.label} ${report.intensity} ${minutes > 0 ? '+' : minutes < 0 ? '\u2212' : ''}`
      + `${Math.abs(minutes)} min ${levelDifferenceText(report.flightLevel, values.level)} ${fixed(report.distanceNm, 0)} NM`);
  }
  return parts;
}

/** The same for a screen reader: whole words, no symbols that are not spoken. */
export function spoken(values, windowM) {
  const parts = [`${dayHhmmZ(values.minute * 60000)}, flight level ${Math.round(values.level)}`];
  if (values.column) {
    parts.push(`Richardson number ${values.richardson === null ? 'missing' : richardsonText(values.richardson)}`
      + ` at a ${fixed(windowM, 0)} metre window`);
    if (values.kind === 'carried') parts.push('carried forward, not observed');
  } else {
    parts.push('no sounding here');
  }
  for (const box of values.boxes) parts.push(`inside ${box.label}, ${intensityWord(box.intensity)}`);
  if (values.report) {
    parts.push(`nearest report ${values.report.label}, ${intensityWord(values.report.intensity)},`
      + ` ${Math.abs(Math.round(values.report.minute - values.minute))} minutes away`);
  }
  return `${parts.join('; ')}.`;
}
