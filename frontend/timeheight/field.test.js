import { test } from 'node:test';
import assert from 'node:assert/strict';
import { BANDS } from '../shared/lib/quarter-scale.js';
import { prepareColumns } from './columns.js';
import { lowestBand, lowestRichardson, paintField } from './field.js';

const START = Date.parse('2031-03-12T12:00Z') / 60000;
const PALETTE = { print: false, text: '#ffffff', bands: BANDS.map((_, index) => [index + 1, 0, 0]), overturnedTick: [99, 0, 0] };

function column(flightLevel, richardson, hours = 2) {
  return prepareColumns([{
    soundingId: 's', version: 1, nominalAt: '2031-03-12T12:00:00Z', launchedAt: '2031-03-12T12:00:00Z',
    carriedUntil: new Date((START + hours * 60) * 60000).toISOString(), notAnalysed: null,
    levels: {
      flightLevel, richardson, heightM: flightLevel.map(it => it * 30), minute: flightLevel.map(() => START),
      shearKtPer1000Ft: flightLevel.map(() => 1), n2PerS2: flightLevel.map(() => 1e-4),
    },
  }])[0];
}

const view = { from: START - 60, until: START + 180, low: 0, high: 100, width: 240, height: 100, scale: 1 };
const at = (image, x, y) => [...image.slice((y * view.width + x) * 4, (y * view.width + x) * 4 + 4)];

test('the solid part is filled, the carried part hatched ever thinner, and outside nothing is drawn', () => {
  const image = paintField([column([0, 100], [0.3, 0.3])], view, PALETTE);
  const band = BANDS.findIndex(it => it.from === 0.25) + 1;
  for (const y of [2, 50, 97]) {
    assert.deepEqual(at(image, 29, y), [0, 0, 0, 0]);
    assert.deepEqual(at(image, 30, y), [band, 0, 0, 255]);
    assert.deepEqual(at(image, 89, y), [band, 0, 0, 255]);
    assert.deepEqual(at(image, 181, y), [0, 0, 0, 0]);
  }
  const share = (from, until) => {
    let ink = 0;
    for (let x = from; x < until; x++) for (let y = 10; y < 90; y++) if (at(image, x, y)[3]) ink++;
    return ink / ((until - from) * 80);
  };
  assert.ok(Math.abs(share(90, 98) - 0.72) < 0.08, `just after: ${share(90, 98)}`);
  // on whole points the hatch of eight points has eight shades, so 0.16 is drawn as one or two points of eight
  assert.ok(share(172, 180) > 0.1 && share(172, 180) <= 0.25, `at the end: ${share(172, 180)}`);
});

test('a layer thinner than a row of the picture is still there', () => {
  const thin = column([0, 49.9, 50, 50.1, 100], [5, 5, 0.2, 5, 5]);
  const image = paintField([thin], { ...view, height: 10 }, PALETTE);
  const tenth = BANDS.findIndex(it => it.from === 0.1) + 1;
  const rows = [];
  for (let y = 0; y < 10; y++) if (image[(y * view.width + 60) * 4] === tenth) rows.push(y);
  assert.ok(rows.length >= 1 && rows.every(y => y === 4 || y === 5), `rows ${rows}`);
});

test('levels that were not observed stay blank', () => {
  const gap = column([0, 40, 41, 59, 60, 100], [2, 2, null, null, 2, 2]);
  const image = paintField([gap], view, PALETTE);
  assert.equal(at(image, 60, 50)[3], 0);
  assert.equal(at(image, 60, 20)[3], 255);
  assert.equal(lowestBand(gap, 45, 55), null);
});

test('on paper the bands are patterns of black, quiet air blank and the lowest solid', () => {
  const paper = { ...PALETTE, print: true, bands: BANDS.map(() => [0, 0, 0]), overturnedTick: [255, 255, 255] };
  const ink = richardson => {
    const image = paintField([column([0, 100], [richardson, richardson])], view, paper);
    let count = 0;
    for (let x = 30; x < 90; x++) for (let y = 0; y < 100; y++) if (at(image, x, y)[3]) count++;
    return count / 6000;
  };
  const shares = [6, 3, 1.5, 0.7, 0.3, 0.2, 0.05].map(ink);
  assert.equal(shares[0], 0);
  assert.equal(shares[6], 1);
  for (let band = 1; band < shares.length; band++) {
    assert.ok(shares[band] > shares[band - 1], `ink ${shares.map(it => it.toFixed(3))}`);
  }
});

test('the lowest Ri of a sounding and its level are those of the level that has it', () => {
  assert.deepEqual(lowestRichardson(column([0, 50, 100], [3, -0.1, null])), { richardson: -0.1, flightLevel: 50 });
  assert.equal(lowestRichardson(column([0, 50], [null, null])), null);
});
