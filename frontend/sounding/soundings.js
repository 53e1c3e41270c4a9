/*
 * The list of soundings: the newest usable ascents as Ri strips on one height axis, and the lowest Ri of each in the
 * table. One analysis after the other is fetched; a strip that can't be had says why and stops no other.
 */
import { flightLevelText } from '../shared/lib/flight-level.js';
import { fixed, isNumber, richardsonText } from '../shared/lib/units.js';
import { dayHhmmZ } from '../shared/lib/utc.js';
import { analysisOf, say, svg, text } from './drawing.js';
import { bandStretches, flightLevelMarks, scale } from './strips.js';

const WIDTH = 1100;
const HEIGHT = 440;
const TOP = 40;
const FOOT = 44;
const LEFT = 52;
const STRIP = 60;
const HIGHEST_M = 16000;

export async function mount(root) {
  const place = root.getElementById('strips');
  if (!place) return;
  const wanted = [...place.querySelectorAll('li[data-id]')].map(item => ({ ...item.dataset }));
  const windowM = place.dataset.windowM;
  const read = [];
  for (const one of wanted) {
    try {
      read.push({ ...one, analysis: await analysisOf(one.id, { windowM }) });
    } catch (problem) {
      read.push({ ...one, problem: problem.message });
    }
  }
  fillTable(root, read);
  const drawn = read.filter(one => one.analysis && one.analysis.profile.length > 0);
  if (drawn.length === 0) {
    say(place, read.find(one => one.problem)?.problem ?? 'None of these ascents could be analysed.');
    return;
  }
  place.replaceChildren(drawing(drawn, windowM));
}

function fillTable(root, read) {
  for (const { id, analysis } of read) {
    const cell = root.querySelector(`[data-lowest="${CSS.escape(id)}"]`);
    if (cell && analysis?.lowest) cell.textContent = `${richardsonText(analysis.lowest.richardson)} ${flightLevelText(analysis.lowest.flightLevel)}`;
  }
}

function drawing(read, windowM) {
  const top = Math.min(HIGHEST_M, read.reduce((most, one) => Math.max(most, one.analysis.profile.at(-1).heightM), 0));
  const y = scale(0, top, HEIGHT - FOOT, TOP);
  const step = (WIDTH - LEFT - 46) / read.length;
  const words = read.map(one => `${one.station} ${dayHhmmZ(one.observedAt)}: lowest Ri ${richardsonText(one.analysis.lowest?.richardson)} at ${flightLevelText(one.analysis.lowest?.flightLevel)}`);
  const image = svg('svg', { class: 'strips', viewBox: `0 0 ${WIDTH} ${HEIGHT}`, role: 'group', 'aria-label': `Richardson number over height, window ${windowM} m. ${words.join('. ')}.` });
  image.append(text(LEFT - 8, TOP - 10, 'FL', '', 'end'), text(WIDTH - 38, TOP - 10, 'km', '', 'start'));
  for (const { flightLevel, heightM } of flightLevelMarks(read[0].analysis.profile, 50)) {
    if (heightM > top) continue;
    image.append(svg('path', { class: 'strips-rule', d: `M${LEFT} ${y(heightM)}H${WIDTH - 46}` }), text(LEFT - 8, y(heightM) + 4, String(flightLevel).padStart(3, '0'), '', 'end'));
  }
  for (let km = 0; km * 1000 <= top; km += 2) image.append(text(WIDTH - 38, y(km * 1000) + 4, String(km), '', 'start'));
  read.forEach((one, k) => {
    const x = LEFT + step * k + (step - STRIP) / 2;
    const link = svg('a', { href: `/soundings/${one.id}`, 'aria-label': words[k] });
    for (const { band, baseM, topM } of bandStretches(one.analysis.profile)) {
      if (baseM >= top) continue;
      const upper = Math.min(top, topM);
      link.append(svg('rect', { class: `strip-band is-band-${band}`, x, y: y(upper), width: STRIP, height: Math.max(0.5, y(baseM) - y(upper)) }));
    }
    const highest = Math.min(top, one.analysis.profile.at(-1).heightM);
    link.append(svg('rect', { class: 'strip-frame', x, y: y(highest), width: STRIP, height: y(one.analysis.profile[0].heightM) - y(highest) }));
    const lowest = one.analysis.lowest;
    if (lowest && isNumber(lowest.heightM) && lowest.heightM <= top) {
      link.append(svg('path', { class: 'strip-lowest', d: `M${x + STRIP} ${y(lowest.heightM)}h8` }), text(x + STRIP + 11, y(lowest.heightM) + 4, richardsonText(lowest.richardson), 'strip-number', 'start'));
    }
    link.append(text(x + STRIP / 2, HEIGHT - 24, one.station, 'strip-title'), text(x + STRIP / 2, HEIGHT - 8, dayHhmmZ(one.observedAt)));
    image.append(link);
  });
  image.append(text(WIDTH / 2, 14, `Ri, window ${fixed(Number(windowM), 0)} m; flight levels of ${read[0].station}`));
  return image;
}
