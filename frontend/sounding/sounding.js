/*
 * One sounding: strips side by side on one height axis, layers as bands across all of them, and the layer table.
 * Everything comes from the analysis document; the page's own table of levels does without this script.
 */
import { flightLevelText } from '../shared/lib/flight-level.js';
import { TICKS } from '../shared/lib/quarter-scale.js';
import { fixed, isNumber, msToKnots, probabilityText, richardsonText, shearText } from '../shared/lib/units.js';
import { analysisOf, html, say, svg, text } from './drawing.js';
import { axis, bandStretches, every, flightLevelMarks, measuredRuns, onQuarterScale, pathOf, runs, scale, ticks } from './strips.js';

const WIDTH = 1240;
const HEIGHT = 620;
const TOP = 46;
const FOOT = 34;
const LEFT = 52;
const RIGHT = 46;
const GAP = 14;
const ARROWS_EVERY_M = 609.6;

export async function mount(root) {
  const place = root.getElementById('analysis');
  if (!place) return;
  const { id, windowM, asKnownAt } = place.dataset;
  try {
    const analysis = await analysisOf(id, { windowM, asKnownAt });
    place.replaceChildren(...strips(analysis), layerTable(analysis), ...growthTable(analysis), ...remarks(analysis));
  } catch (problem) {
    say(place, problem.message);
  }
}

function strips(analysis) {
  const { profile, levels } = analysis;
  if (profile.length === 0) return [html('p', { class: 'empty' }, 'There is no analysis of this sounding: see what to know about it below.')];
  const base = Math.min(profile[0].heightM, ...levels.map(l => l.heightM).filter(isNumber).slice(0, 1));
  const top = profile[profile.length - 1].heightM;
  const y = scale(base, top, HEIGHT - FOOT, TOP);
  const width = (WIDTH - LEFT - RIGHT - 6 * GAP) / 7;
  const drawing = svg('svg', {
    class: 'strips', viewBox: `0 0 ${WIDTH} ${HEIGHT}`, role: 'img',
    'aria-label': `Temperature, wind, static stability, shear, Richardson number, its probability of lying below a quarter, and growth of ${analysis.station} on one height axis, window ${fixed(analysis.method.windowM, 0)} m. The layer table below has the numbers.`,
  });
  drawing.append(heightAxis(profile, base, top, y));
  for (const layer of analysis.layers) drawing.append(layerBand(layer, y));
  const inside = list => list.filter(l => isNumber(l.heightM) && l.heightM >= base && l.heightM <= top).sort((a, b) => a.heightM - b.heightM);
  const reported = inside(levels);
  const x0 = k => LEFT + k * (width + GAP);
  drawing.append(
    temperatureStrip(reported, x0(0), width, y),
    windStrip(reported, x0(1), width, y),
    lineStrip('N², 1e-4 s⁻²', profile, p => (isNumber(p.n2PerS2) ? p.n2PerS2 * 1e4 : null), x0(2), width, y),
    lineStrip('shear, kt/1000 ft', profile, p => p.shearKtPer1000Ft, x0(3), width, y),
    richardsonStrip(analysis, x0(4), width, y),
    probabilityStrip(analysis, x0(5), width, y),
    growthStrip(analysis, x0(6), width, y),
  );
  return [drawing];
}

function heightAxis(profile, base, top, y) {
  const group = svg('g', { class: 'strips-axis' });
  group.append(text(LEFT - 8, TOP - 10, 'FL', '', 'end'), text(WIDTH - RIGHT + 8, TOP - 10, 'km', '', 'start'));
  for (const { flightLevel, heightM } of flightLevelMarks(profile, 50)) {
    if (heightM < base || heightM > top) continue;
    group.append(svg('path', { class: 'strips-rule', d: `M${LEFT} ${y(heightM)}H${WIDTH - RIGHT}` }), text(LEFT - 8, y(heightM) + 4, String(flightLevel).padStart(3, '0'), '', 'end'));
  }
  for (let km = Math.ceil(base / 1000); km * 1000 <= top; km += top - base > 16000 ? 2 : 1) {
    group.append(svg('path', { class: 'strips-tick', d: `M${WIDTH - RIGHT} ${y(km * 1000)}h5` }), text(WIDTH - RIGHT + 8, y(km * 1000) + 4, String(km), '', 'start'));
  }
  return group;
}

function layerBand(layer, y) {
  const height = Math.max(2, y(layer.baseHeightM) - y(layer.topHeightM));
  return svg('g', { class: 'strips-layer' },
    svg('rect', { x: LEFT, y: y(layer.topHeightM), width: WIDTH - LEFT - RIGHT, height }),
    text(LEFT + 4, y(layer.topHeightM) - 3, layer.letter, 'strips-letter', 'start'));
}

function frame(title, x, width, { from, until, step }, label = value => String(value).replace('-', '−')) {
  const group = svg('g', { class: 'strip' });
  group.append(text(x + width / 2, 16, title, 'strip-title'), svg('rect', { class: 'strip-frame', x, y: TOP, width, height: HEIGHT - TOP - FOOT }));
  const place = scale(from, until, x, x + width);
  for (const value of ticks({ from, until, step })) {
    const anchor = value === from ? 'start' : value === until ? 'end' : 'middle';
    group.append(svg('path', { class: 'strips-tick', d: `M${place(value)} ${HEIGHT - FOOT}v5` }), text(place(value), HEIGHT - FOOT + 18, label(Math.round(value * 1000) / 1000), '', anchor));
  }
  return [group, place];
}

function temperatureStrip(levels, x, width, y) {
  const [group, place] = frame('temperature, dew point, °C', x, width, axis(levels.flatMap(l => [l.temperatureC, l.dewPointC])));
  group.append(
    svg('path', { class: 'strip-line', d: pathOf(measuredRuns(levels, l => l.temperatureC, 'TEMPERATURE_GAP'), place, y) }),
    svg('path', { class: 'strip-line is-broken', d: pathOf(measuredRuns(levels, l => l.dewPointC, 'TEMPERATURE_GAP'), place, y) }));
  return group;
}

function windStrip(levels, x, width, y) {
  const winds = levels.filter(l => isNumber(l.windSpeedMs));
  const [group, place] = frame('wind, kt', x, width, axis([0, ...winds.map(l => msToKnots(l.windSpeedMs))]));
  group.append(svg('path', { class: 'strip-line', d: pathOf(measuredRuns(winds, l => msToKnots(l.windSpeedMs), 'WIND_GAP'), place, y) }));
  for (const level of every(winds, ARROWS_EVERY_M)) {
    // north is up; the arrow points where the wind blows to
    group.append(svg('path', { class: 'strip-arrow', d: 'M0 7V-7M-3 -3L0 -7L3 -3', transform: `translate(${x + width - 12} ${y(level.heightM)}) rotate(${(level.windFromDeg + 180) % 360})` }));
  }
  return group;
}

function lineStrip(title, profile, value, x, width, y) {
  const [group, place] = frame(title, x, width, axis([0, ...profile.map(value)]));
  group.append(svg('path', { class: 'strip-line', d: pathOf(runs(profile, value), place, y) }));
  return group;
}

function richardsonStrip(analysis, x, width, y) {
  const group = svg('g', { class: 'strip' });
  const place = scale(0, 1, x, x + width);
  group.append(text(x + width / 2, 16, `Ri, window ${fixed(analysis.method.windowM, 0)} m`, 'strip-title'));
  for (const { band, baseM, topM } of bandStretches(analysis.profile)) {
    group.append(svg('rect', { class: `strip-band is-band-${band}`, x, y: y(topM), width: 10, height: Math.max(0.5, y(baseM) - y(topM)) }));
  }
  group.append(svg('rect', { class: 'strip-frame', x, y: TOP, width, height: HEIGHT - TOP - FOOT }));
  for (const { richardson, q, label } of TICKS) {
    group.append(text(place(q), HEIGHT - FOOT + 18, label, '', q === 0 ? 'start' : 'middle'));
    if (richardson === 0.25 || richardson === 1) {
      group.append(svg('path', { class: richardson === 1 ? 'strip-one' : 'strip-quarter', d: `M${place(q)} ${TOP}V${HEIGHT - FOOT}` }));
    }
  }
  group.append(
    svg('path', { class: 'strip-line', d: pathOf(runs(analysis.profile, onQuarterScale), place, y) }),
    svg('path', { class: 'strip-line is-dotted', d: pathOf(runs(analysis.profile, p => (p.richardsonMoist === p.richardson ? null : onQuarterScale({ richardson: p.richardsonMoist }))), place, y) }));
  return group;
}

function probabilityStrip(analysis, x, width, y) {
  const [group, place] = frame('P(Ri < ¼) at a level', x, width, axis([0, 1]));
  group.append(svg('path', { class: 'strip-line', d: pathOf(runs(analysis.profile, p => p.probabilityRichardsonBelowQuarter), place, y) }));
  return group;
}

/** A bar at each layer that grows; its length is the growth in ten minutes, in e-foldings, beside it the wavelength. */
function growthStrip(analysis, x, width, y) {
  const growing = analysis.layers.filter(isSolved);
  const [group, place] = frame('e-foldings in 10 min', x, width, axis([0, 1, ...growing.map(l => l.mode.growthRatePerS * 600)]));
  for (const layer of growing) {
    const at = y((layer.baseHeightM + layer.topHeightM) / 2);
    group.append(svg('rect', { class: 'strip-growth', x, y: at - 4, width: Math.max(1, place(layer.mode.growthRatePerS * 600) - x), height: 8 }),
      text(x + width - 4, at - 8, `${fixed(layer.mode.wavelengthM / 1000, 1)} km`, '', 'end'));
  }
  if (growing.length === 0) group.append(text(x + width / 2, TOP + 16, 'no growing wave found'));
  return group;
}

/** Whether the search for growing waves came to an end and found one. */
function isSolved(layer) {
  return layer.mode?.converged === true && isNumber(layer.mode.growthRatePerS);
}

/** What was solved for each layer; a layer without a growing wave says why. */
function growthTable(analysis) {
  if (analysis.layers.length === 0) return [];
  const number = (value, digits, per = 1) => (isNumber(value) ? fixed(value / per, digits) : '-');
  const mode = layer => (isSolved(layer) ? layer.mode : null);
  const atWindow = (layer, m) => {
    const one = layer.growthByWindow?.find(other => other.windowM === m);
    return isNumber(one?.eFoldingMin) ? fixed(one.eFoldingMin, 1) : one?.growthRatePerS === 0 ? 'stable' : 'unknown';
  };
  const columns = [
    ['Layer', l => l.letter], ['Wavelength, km', l => number(mode(l)?.wavelengthM, 1, 1000)],
    ...[200, 150, 100].map(m => [`E-folding, ${m} m window, min`, l => atWindow(l, m)]),
    ['Waves along', l => (isNumber(mode(l)?.azimuthDeg) ? `${String(Math.round(l.mode.azimuthDeg)).padStart(3, '0')}°` : '-')],
    ['Phase speed, kt', l => (isNumber(mode(l)?.phaseSpeedMs) ? fixed(msToKnots(l.mode.phaseSpeedMs), 0) : '-')],
    ['Critical height, km', l => number(mode(l)?.criticalHeightM, 2, 1000)], ['Billow height, m', l => number(l.billow?.heightM, 0)],
    ['Crests pass a fixed point, s', l => number(l.billow?.passingIntervalS, 0)],
    ['EDR, if it breaks', l => (isNumber(l.turbulence?.edrLow) ? `${fixed(l.turbulence.edrLow, 2)} to ${fixed(l.turbulence.edrHigh, 2)}` : '-')],
  ];
  const table = html('table', { class: 'ledger table' },
    html('caption', {}, 'Growing waves, solved, at the three windows; billows and turbulence they would become.'),
    html('thead', {}, html('tr', {}, ...columns.map(([name]) => html('th', { scope: 'col', class: 'num number' }, name)))),
    html('tbody', {}, ...analysis.layers.map(layer => html('tr', {}, ...columns.map(([, value], k) =>
      html(k === 0 ? 'th' : 'td', k === 0 ? { scope: 'row' } : { class: 'num number nowrap' }, value(layer)))))));
  const said = analysis.layers.flatMap(l => [l.modeReason ?? l.mode?.reason, l.probabilityUnknownBecause && `P(Ri < ¼) is unknown: ${l.probabilityUnknownBecause}`,
    ...(l.growthByWindow ?? []).filter(one => one.reason && one.windowM !== analysis.method.windowM).map(one => `at ${fixed(one.windowM, 0)} m: ${one.reason}`)]
    .filter(Boolean).map(note => `Layer ${l.letter}: ${note}`).concat([l.turbulence?.inWords && `Layer ${l.letter}: EDR ${l.turbulence.inWords}`].filter(Boolean)));
  return [html('div', { class: 'ledger-scroll', tabindex: '0', role: 'region', 'aria-label': 'Growing waves' }, table),
    html('ul', {}, ...said.map(note => html('li', {}, note)), html('li', {}, html('a', { href: '/method#growth' }, 'How growth is solved for, and why you may disagree')))];
}

function layerTable(analysis) {
  const window = `${fixed(analysis.method.windowM, 0)} m`;
  if (analysis.layers.length === 0) {
    const lowest = analysis.lowest;
    return html('p', { class: 'empty' }, lowest
      ? `No layer below the thresholds. Lowest Ri ${richardsonText(lowest.richardson)} at ${flightLevelText(lowest.flightLevel)}, window ${window}.`
      : 'No layer below the thresholds.');
  }
  const columns = [
    ['Layer', l => l.letter], ['From', l => flightLevelText(l.baseFlightLevel)], ['to', l => flightLevelText(l.topFlightLevel)], ['Depth, m', l => fixed(l.depthM, 0)],
    [`Min Ri, ${window}`, l => richardsonText(l.minRichardson)], ['at', l => flightLevelText(l.minRichardsonFlightLevel)], ['Bulk Ri', l => richardsonText(l.bulkRichardson)],
    [`P(Ri < ¼), ${window}`, l => probabilityText(l.probabilityRichardsonBelowQuarter)], ['Shear, kt/1000 ft', l => shearText(l.shear1000FtKt)],
    ['Wind change, kt', l => fixed(msToKnots(l.windChangeMs), 0)], ['Wind', l => windText(l)],
    ['Wavelength by rule, km', l => (isNumber(l.rule?.wavelengthM) ? fixed(l.rule.wavelengthM / 1000, 1) : '-')],
    ['E-folding by rule, min', l => (isNumber(l.rule?.eFoldingMin) ? fixed(l.rule.eFoldingMin, 1) : '-')], ['State', l => l.state.toLowerCase().replaceAll('_', ' ')],
  ];
  const table = html('table', { class: 'ledger table' },
    html('caption', {}, `Layers, window ${window} (full width at half maximum). Wavelength and e-folding here are by the depth rule, not solved.`),
    html('thead', {}, html('tr', {}, ...columns.map(([name]) => html('th', { scope: 'col', class: 'num number' }, name)))),
    html('tbody', {}, ...analysis.layers.map(layer => html('tr', {}, ...columns.map(([, value], k) =>
      html(k === 0 ? 'th' : 'td', k === 0 ? { scope: 'row' } : { class: 'num number nowrap' }, value(layer)))))));
  return html('div', { class: 'ledger-scroll', tabindex: '0', role: 'region', 'aria-label': 'Layers' }, table);
}

function windText(layer) {
  return isNumber(layer.meanWindFromDeg) ? `${String(Math.round(layer.meanWindFromDeg) % 360 || 360).padStart(3, '0')}° ${fixed(msToKnots(layer.meanWindMs), 0)} kt` : '-';
}

function remarks(analysis) {
  const notes = [...analysis.remarks.map(note => note.text), ...analysis.layers.flatMap(layer => layer.remarks.map(note => `Layer ${layer.letter}: ${note.text}`))];
  return notes.length === 0 ? [] : [html('ul', {}, ...notes.map(note => html('li', {}, note)))];
}
