import { test } from 'node:test';
import assert from 'node:assert/strict';
import { axis, bandStretches, every, flightLevelMarks, measuredRuns, pathOf, runs, scale, ticks } from './strips.js';
import { BANDS } from '../shared/lib/quarter-scale.js';

test('flight levels lie where the sounding itself puts them', () => {
  const marks = flightLevelMarks([{ heightM: 1000, flightLevel: 30 }, { heightM: 3000, flightLevel: 90 }, { heightM: 3500, flightLevel: null }, { heightM: 4000, flightLevel: 130 }], 50);
  assert.deepEqual(marks.map(m => m.flightLevel), [50, 100]);
  assert.ok(Math.abs(marks[0].heightM - (1000 + 2000 * 20 / 60)) < 1e-9);
  assert.ok(Math.abs(marks[1].heightM - 3250) < 1e-9);
});

test('a missing value breaks the line', () => {
  const lines = runs([{ heightM: 0, v: 1 }, { heightM: 10, v: 2 }, { heightM: 20, v: null }, { heightM: 30, v: 3 }], p => p.v);
  assert.deepEqual(lines, [[[1, 0], [2, 10]], [[3, 30]]]);
  const identity = value => value;
  assert.equal(pathOf(lines, identity, identity), 'M1 0L2 10M2 30h2');
});

test('a line runs through levels of another quantity and stops at a marked gap', () => {
  const levels = [{ heightM: 0, v: 1 }, { heightM: 5, v: null }, { heightM: 10, v: 2, flags: ['WIND_GAP'] }, { heightM: 90, v: 3, flags: ['WIND_GAP'] }, { heightM: 99, v: 4 }];
  assert.deepEqual(measuredRuns(levels, l => l.v, 'WIND_GAP'), [[[1, 0], [2, 10]], [[3, 90], [4, 99]]]);
  assert.deepEqual(measuredRuns(levels, l => l.v, 'TEMPERATURE_GAP').length, 1);
});

test('neighbouring points of one band are one stretch and what has no number is left open', () => {
  const profile = [0, 100, 200, 300, 400].map((heightM, k) => ({ heightM, richardson: [0.2, 0.15, null, 0.6, -0.1][k], flags: [] }));
  const stretches = bandStretches(profile);
  assert.deepEqual(stretches.map(s => [s.baseM, s.topM]), [[0, 150], [250, 350], [350, 400]]);
  assert.equal(BANDS[stretches[0].band].token, '--ri-tenth');
  assert.equal(stretches[2].band, BANDS.length - 1);
});

test('overturned air is a band of its own even where its number is missing', () => {
  const [one] = bandStretches([{ heightM: 0, richardson: null, flags: ['OVERTURNED'] }, { heightM: 10, richardson: null, flags: ['NO_SHEAR'] }]);
  assert.equal(one.band, BANDS.length - 1);
});

test('axes end on round numbers', () => {
  assert.deepEqual(axis([-57.3, 12.1]), { from: -60, until: 20, step: 20 });
  assert.deepEqual(ticks(axis([0, 131])), [0, 50, 100, 150]);
  assert.deepEqual(axis([]), { from: 0, until: 1, step: 1 });
  assert.ok(axis([3, 3]).until > axis([3, 3]).from);
});

test('thousands of levels make no trouble', () => {
  const values = Array.from({ length: 200000 }, (_, k) => k % 77);
  assert.deepEqual(axis(values), { from: 0, until: 80, step: 20 });
});

test('arrows stand apart by the step asked for', () => {
  const levels = Array.from({ length: 100 }, (_, k) => ({ heightM: k * 10, windFromDeg: k === 3 ? null : 250 }));
  assert.deepEqual(every(levels, 300).map(l => l.heightM), [0, 300, 600, 900]);
});

test('a scale maps its ends onto the ends', () => {
  const y = scale(0, 12000, 500, 20);
  assert.equal(y(0), 500);
  assert.equal(y(12000), 20);
});
