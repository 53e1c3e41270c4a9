import { test } from 'node:test';
import assert from 'node:assert/strict';
import {
  columnAt, crossings, extentAt, kilometreTicks, minuteAt, prepareColumns, richardsonAt, richardsonOfSigned,
  signedQuarterScale, valueAt,
} from './columns.js';

const minute = text => Date.parse(text) / 60000;
const LAUNCH = minute('2031-03-12T11:15Z');

/** A sounding to FL400 that rises 10 levels a minute, Ri given at every hundred levels. */
function sounding(richardson, over = {}) {
  return {
    soundingId: 's1', version: 1, nominalAt: '2031-03-12T12:00:00Z', launchedAt: '2031-03-12T11:15:00Z',
    carriedUntil: '2031-03-12T18:00:00Z', notAnalysed: null,
    levels: {
      flightLevel: [0, 100, 200, 300, 400],
      heightM: [50, 3000, 6000, 9000, 12000],
      minute: [0, 10, 20, 30, 40].map(it => LAUNCH + it),
      richardson,
      shearKtPer1000Ft: [1, 2, 3, 4, 5],
      n2PerS2: [1e-4, 1e-4, 1e-4, 1e-4, 4e-4],
    },
    ...over,
  };
}

test('a column stands half an hour either side of the balloon at each level', () => {
  const [column] = prepareColumns([sounding([5, 4, 3, 0.1, 2])]);
  const low = extentAt(column, 0);
  const high = extentAt(column, 300);
  assert.deepEqual(low, { start: LAUNCH - 30, end: LAUNCH + 30, until: minute('2031-03-12T18:00Z') });
  assert.equal(high.start, LAUNCH);
  assert.equal(extentAt(column, 401), null);
  assert.equal(extentAt(column, -1), null);
});

test('after the end of its time nothing of a sounding is left', () => {
  const columns = prepareColumns([sounding([5, 4, 3, 0.1, 2])]);
  assert.equal(columnAt(columns, LAUNCH + 20, 200).kind, 'solid');
  assert.equal(columnAt(columns, minute('2031-03-12T17:59Z'), 200).kind, 'carried');
  assert.equal(columnAt(columns, minute('2031-03-12T18:01Z'), 200), null);
  assert.equal(columnAt(columns, LAUNCH - 40, 0), null);
});

test('a newer sounding ends the older one, and only where it reached', () => {
  const newer = sounding([5, 4, 3, 2, 1], {
    soundingId: 's2', nominalAt: '2031-03-12T15:00:00Z', launchedAt: '2031-03-12T14:15:00Z',
    carriedUntil: '2031-03-12T21:00:00Z',
    levels: {
      flightLevel: [0, 200], heightM: [50, 6000], minute: [minute('2031-03-12T14:15Z'), minute('2031-03-12T14:35Z')],
      richardson: [5, 5], shearKtPer1000Ft: [1, 1], n2PerS2: [1e-4, 1e-4],
    },
  });
  const columns = prepareColumns([newer, sounding([5, 4, 3, 0.1, 2])]);
  assert.equal(columns[0].soundingId, 's1');
  assert.equal(extentAt(columns[0], 100).until, minute('2031-03-12T14:25Z') - 30);
  assert.equal(extentAt(columns[0], 300).until, minute('2031-03-12T18:00Z'));
  assert.equal(columnAt(columns, minute('2031-03-12T16:00Z'), 100).column.soundingId, 's2');
  assert.equal(columnAt(columns, minute('2031-03-12T16:00Z'), 300).column.soundingId, 's1');
});

test('beside a missing value nothing is interpolated', () => {
  const [column] = prepareColumns([sounding([5, 4, null, 0.1, 2])]);
  assert.equal(richardsonAt(column, 150), null);
  assert.equal(richardsonAt(column, 250), null);
  assert.equal(richardsonAt(column, 200), null);
  assert.ok(Math.abs(richardsonAt(column, 300) - 0.1) < 1e-12);
  assert.equal(minuteAt(column, 150), LAUNCH + 15);
  assert.equal(valueAt(column, column.shearKtPer1000Ft, 250), 3.5);
});

test('the signed scale rises through zero without a step and can be turned back', () => {
  let before = -Infinity;
  for (let ri = -3; ri < 20; ri += 0.01) {
    const q = signedQuarterScale(ri);
    assert.ok(q > before);
    assert.ok(Math.abs(richardsonOfSigned(q) - ri) < 1e-9 * (1 + ri * ri));
    before = q;
  }
  assert.ok(Number.isNaN(signedQuarterScale(null)));
});

test('crossings of a threshold are found on the quarter-scale, and none across a gap', () => {
  const [column] = prepareColumns([sounding([1, 0.25, 0.1, 0.25, 1])]);
  assert.deepEqual(crossings(column, 0.25), [100, 300]);
  // exact: half way between q(1) = 0.8 and q(1/4) = 0.5 lies q = 0.65, Ri = 13/28
  assert.ok(Math.abs(crossings(column, 13 / 28)[0] - 50) < 1e-9);
  const [gap] = prepareColumns([sounding([1, null, 0.1, null, 1])]);
  assert.deepEqual(crossings(gap, 0.25), []);
});

test('a sounding that was not analysed has a path at five metres a second and no values', () => {
  const [column] = prepareColumns([sounding([], { notAnalysed: 'only 9 wind levels', levels: null })]);
  assert.equal(column.analysed, false);
  // exact: 450 levels of 30.48 m at 5 m/s are 45.72 min
  assert.ok(Math.abs(minuteAt(column, 450) - LAUNCH - 45.72) < 1e-6);
  assert.equal(richardsonAt(column, 200), null);
  assert.deepEqual(crossings(column, 0.25), []);
});

test('kilometre ticks come from the sounding itself', () => {
  const [column] = prepareColumns([sounding([1, 1, 1, 1, 1])]);
  const ticks = kilometreTicks(column, 3);
  assert.deepEqual(ticks.map(it => it.km), [3, 6, 9]);
  assert.deepEqual(ticks.map(it => it.flightLevel), [100, 200, 300]);
});
