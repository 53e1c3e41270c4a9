import { test } from 'node:test';
import assert from 'node:assert/strict';
import { epochMinute } from '../shared/lib/utc.js';
import { prepareColumns } from './columns.js';
import { boxesAt, boxesOf, columnNotesOf, referencesOf, richardsonSegments } from './segments.js';

const START = epochMinute('2031-03-12T12:00Z');
const column = (over = {}) => ({
  soundingId: 's', version: 1, nominalAt: '2031-03-12T12:00:00Z', launchedAt: '2031-03-12T12:00:00Z',
  carriedUntil: '2031-03-12T18:00:00Z', notAnalysed: null, tropopauseFlightLevel: 368, maxWindKt: 131,
  maxWindFlightLevel: 347, maxWindAtTopOfData: false,
  levels: {
    flightLevel: [0, 200, 300, 400], heightM: [0, 6000, 9000, 12000], minute: [0, 20, 30, 40].map(it => START + it),
    richardson: [4, 4, 0.1, 4], shearKtPer1000Ft: [1, 1, 1, 1], n2PerS2: [1, 1, 1, 1],
  },
  ...over,
});

test('every crossing of 0.25 and 1 is a line over the time of its column, the critical ones drawn last', () => {
  const segments = richardsonSegments(prepareColumns([column()]));
  assert.deepEqual(segments.map(it => it.critical), [false, false, true, true]);
  assert.ok(segments.every(it => it.carriedUntil === epochMinute('2031-03-12T18:00Z') && it.until - it.from === 60));
});

test('a column says from which sounding it is carried, and one that was not analysed says why', () => {
  const [good, bad] = columnNotesOf(prepareColumns([column(), column({
    soundingId: 't', launchedAt: '2031-03-12T20:00:00Z', nominalAt: '2031-03-12T20:00:00Z',
    carriedUntil: '2031-03-13T02:00:00Z', notAnalysed: 'only 9 wind levels', levels: null,
  })]), 450);
  assert.equal(good.carried, 'carried from 1200Z');
  assert.equal(good.problem, '');
  assert.equal(bad.problem, 'not analysed: only 9 wind levels');
  assert.equal(bad.carried, '');
});

test('tropopause and jet are named by level; a maximum at the top of the data says it may be higher', () => {
  const lines = referencesOf(prepareColumns([column({ maxWindAtTopOfData: true })]));
  assert.deepEqual(lines.map(it => it.text), ['TROP FL368', 'J 131 kt FL347 may be higher']);
  assert.equal(lines[1].open, true);
  assert.deepEqual(referencesOf(prepareColumns([column({ tropopauseFlightLevel: null, maxWindKt: null })])), []);
});

test('a box carries its version from the second on', () => {
  const box = { number: 2, version: 1, filedAt: '2031-03-12T07:40Z', validFrom: '2031-03-12T09:00Z', validUntil: '2031-03-12T13:00Z', probabilityPercent: 70 };
  assert.equal(boxesOf([box], epochMinute)[0].label, 'SLF 2');
  assert.equal(boxesOf([{ ...box, version: 2, label: 'SLF 02' }], epochMinute)[0].label, 'SLF 02 v2');
  assert.equal(boxesOf([{ ...box, probabilityPercent: null }], epochMinute)[0].probability, '');
});

test('a point lies inside the version that was in force at its moment', () => {
  const version = (number, filedAt, replacedAt, from, cancelled = false) => ({
    forecastId: 7, number: 2, version: number, filedAt, replacedAt, validFrom: from, validUntil: '2031-03-12T13:00Z', baseFlightLevel: 270, topFlightLevel: 310,
    superseded: number === 1, cancelled,
  });
  const boxes = boxesOf([version(1, '2031-03-12T07:40Z', '2031-03-12T11:50Z', '2031-03-12T09:00Z'),
    version(2, '2031-03-12T11:50Z', '2031-03-12T12:30Z', '2031-03-12T11:50Z'),
    version(3, '2031-03-12T12:30Z', null, '2031-03-12T11:50Z', true)], epochMinute);
  const inside = time => boxesAt(boxes, epochMinute(`2031-03-12T${time}Z`), 290).map(box => box.version);
  assert.deepEqual(inside('08:59'), []);
  assert.deepEqual(inside('10:58'), [1]);
  assert.deepEqual(inside('11:56'), [2]);
  assert.deepEqual(inside('12:45'), []);
});

test('a version replaced before it began was never in force', () => {
  const box = (version, filedAt, replacedAt, base) => ({
    forecastId: 5, number: 5, version, filedAt, replacedAt, validFrom: '2031-03-12T20:00Z', validUntil: '2031-03-12T23:59Z', baseFlightLevel: base, topFlightLevel: 310,
  });
  const boxes = boxesOf([box(1, '2031-03-12T19:50Z', '2031-03-12T19:56Z', 160), box(2, '2031-03-12T19:56Z', null, 260)], epochMinute);
  assert.deepEqual(boxesAt(boxes, epochMinute('2031-03-12T21:00Z'), 200), []);
  assert.deepEqual(boxesAt(boxes, epochMinute('2031-03-12T21:00Z'), 290).map(it => it.version), [2]);
});
