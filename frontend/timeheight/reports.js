/* Air-reports on the display: those that would lie on one another are one mark with a list behind it. */
import { heavierFirst } from '../shared/lib/intensity.js';

/**
 * Groups reports nearer to one another than `across` minutes and `up` flight levels.
 *
 * @param reports with `minute` and `flightLevel`
 * @returns clusters `{minute, level, reports, worst}` in the order of time; `worst` is the heaviest that is not
 *          excluded from scoring, or the heaviest at all, and gives the cluster its place
 */
export function clustered(reports, across, up) {
  const clusters = [];
  for (const report of [...reports].sort((a, b) => a.minute - b.minute)) {
    const home = clusters.find(cluster => Math.abs(cluster.minute - report.minute) < across
      && Math.abs(cluster.level - report.flightLevel) < up);
    if (home) home.reports.push(report);
    else clusters.push({ minute: report.minute, level: report.flightLevel, reports: [report] });
  }
  for (const cluster of clusters) {
    const byWeight = [...cluster.reports].sort((a, b) =>
      Number(Boolean(a.excluded)) - Number(Boolean(b.excluded)) || heavierFirst(a.intensity, b.intensity));
    cluster.worst = byWeight[0];
    cluster.minute = cluster.worst.minute;
    cluster.level = cluster.worst.flightLevel;
  }
  return clusters.sort((a, b) => a.minute - b.minute);
}

// half an hour, 2000 ft and 60 NM count as equally far: the widest of the usual matching tolerances
const MINUTES = 30;
const LEVELS = 20;
const MILES = 60;

/** The report nearest to a point in time and level, its distance from the station counted too; null if there is none. */
export function nearestReport(reports, minute, level) {
  let best = null;
  let shortest = Infinity;
  for (const report of reports) {
    const far = ((report.minute - minute) / MINUTES) ** 2 + ((report.flightLevel - level) / LEVELS) ** 2
      + ((report.distanceNm ?? 0) / MILES) ** 2;
    if (far < shortest) { shortest = far; best = report; }
  }
  return best;
}

/** The report after (step 1) or before (step −1) a minute; from an exact hit it goes on to the next. */
export function steppedReport(reports, current, minute, step) {
  const sorted = [...reports].sort((a, b) => a.minute - b.minute || a.flightLevel - b.flightLevel);
  const at = current ? sorted.findIndex(it => it.reportId === current.reportId) : -1;
  if (at >= 0) return sorted[at + step] ?? null;
  return step > 0 ? sorted.find(it => it.minute >= minute) ?? null : sorted.findLast(it => it.minute <= minute) ?? null;
}
