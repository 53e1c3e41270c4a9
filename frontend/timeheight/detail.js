/* The detail of what was chosen: a sounding, a forecast with its versions, or a report (or the list on one spot). */
import { make, symbol } from '../shared/elements/make.js';
import { flightLevelText } from '../shared/lib/flight-level.js';
import { intensityWord } from '../shared/lib/intensity.js';
import { fixed, isNumber, knotsText, MISSING, percentText, richardsonText } from '../shared/lib/units.js';
import { dayHhmmZ, hhmmZ, spanText } from '../shared/lib/utc.js';
import { lowestRichardson } from './field.js';

export function detailOf(choice, display, deskMinute) {
  if (!choice) {
    return [make('p', { className: 'legend-note' },
      'Choose a sounding, a box or a report: with the mouse, or with the arrow keys and Enter.')];
  }
  if (choice.kind === 'reports') return choice.reports.flatMap(reportDetail);
  if (choice.kind === 'box') return boxDetail(choice.box, display);
  return columnDetail(choice.column, display, deskMinute);
}

function facts(pairs) {
  const list = make('dl', { className: 'facts' });
  for (const [name, value] of pairs) {
    if (value !== null && value !== undefined && value !== '') list.append(make('dt', {}, name), make('dd', {}, value));
  }
  return list;
}

const link = (address, text) => make('p', {}, make('a', { className: 'button', href: address }, text));
const id = value => encodeURIComponent(value);

function columnDetail(column, display, deskMinute) {
  const lowest = lowestRichardson(column);
  return [
    make('h3', {}, `${display.station.name} ${dayHhmmZ(column.nominalMinute * 60000)}`),
    facts([
      ['released', column.launchedAt ? dayHhmmZ(column.launchedAt) : MISSING],
      ['age', isNumber(deskMinute) ? spanText(deskMinute - column.launchedMinute) : null],
      ['version', String(column.version)],
      ['not analysed', column.analysed ? null : column.notAnalysed],
      ['lowest Ri', lowest && `${richardsonText(lowest.richardson)} at ${flightLevelText(lowest.flightLevel)}, ${display.windowM} m window`],
      ['tropopause', flightLevelText(column.tropopauseFlightLevel)],
      ['highest wind', isNumber(column.maxWindKt) ? `${knotsText(column.maxWindKt)} at ${flightLevelText(column.maxWindFlightLevel)}`
        + (column.maxWindAtTopOfData ? ', top of the data: may be higher' : '') : MISSING],
      ['also as', (column.coarserSoundingIds ?? []).map(it => `sounding ${it}, fewer levels`).join(', ')],
      ['carried until', dayHhmmZ(column.carriedUntilMinute * 60000)],
    ]),
    link(column.analysed ? `/soundings/${id(column.soundingId)}` : '/intake', column.analysed ? 'Open sounding' : 'Open Intake'),
  ];
}

function boxDetail(box, display) {
  const versions = display.boxes.filter(other => other.forecastId === box.forecastId)
    .sort((a, b) => b.version - a.version);
  return [
    make('h3', {}, symbol(box.intensity), `${box.label}, ${intensityWord(box.intensity)}`),
    facts([
      ['levels', `${flightLevelText(box.base)} to ${flightLevelText(box.top)}`],
      ['valid', `${dayHhmmZ(box.validFrom)} to ${hhmmZ(box.validUntil)}`],
      ['probability', percentText(box.probabilityPercent)],
      ['state', box.cancelled ? 'cancelled' : box.superseded ? 'superseded' : String(box.state ?? '').toLowerCase()],
      ['versions', versions.map(it => `${it.version}: ${intensityWord(it.intensity)}, ${flightLevelText(it.base)} to `
        + `${flightLevelText(it.top)}, ${hhmmZ(it.validFrom)} to ${hhmmZ(it.validUntil)}`).join(' · ')],
    ]),
    link(`/forecasts/${id(box.forecastId)}`, 'Open forecast'),
  ];
}

function reportDetail(report) {
  return [
    make('h3', {}, symbol(report.intensity), `${report.label}, ${intensityWord(report.intensity)}`),
    facts([
      ['observed', dayHhmmZ(report.observedAt)],
      ['level', flightLevelText(report.flightLevel)],
      ['peak EDR', isNumber(report.edrPeak) ? fixed(report.edrPeak, 2) : null],
      ['class', report.reportClass],
      ['how', report.automated ? 'automated' : 'voice'],
      ['cloud', report.inCloud === true ? 'in cloud' : report.inCloud === false ? 'clear air' : null],
      ['from station', `${fixed(report.distanceNm, 0)} NM, bearing ${String(Math.round(report.bearingDeg ?? 0)).padStart(3, '0')}`],
      ['inside', (report.insideForecasts ?? []).join(', ') || 'no forecast'],
      ['scoring', report.excluded ? 'left out' : null],
    ]),
    link(`/air-reports/${id(report.reportId)}`, 'Open report'),
  ];
}
