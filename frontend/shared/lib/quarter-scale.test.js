import { test } from 'node:test';
import assert from 'node:assert/strict';
import { BANDS, bandOf, quarterScale, richardsonOf, TICKS } from './quarter-scale.js';

// exact: Ri / (Ri + 0.25)
test('the critical value is in the middle, zero at the start and infinity at the end', () => {
  assert.equal(quarterScale(0.25), 0.5);
  assert.equal(quarterScale(0), 0);
  assert.equal(quarterScale(1), 0.8);
  assert.equal(quarterScale(Infinity), 1);
});

test('negative and missing values have no place on the scale', () => {
  for (const value of [-0.01, NaN, null, undefined]) assert.equal(quarterScale(value), null);
});

test('the scale and its inverse undo each other and the scale rises', () => {
  let before = -1;
  for (let ri = 0; ri < 60; ri = ri * 1.2 + 0.01) {
    const q = quarterScale(ri);
    assert.ok(Math.abs(richardsonOf(q) - ri) < 1e-9 * (1 + ri));
    assert.ok(q > before);
    before = q;
  }
  assert.equal(richardsonOf(1), Infinity);
  assert.throws(() => richardsonOf(1.01), RangeError);
});

test('ticks are labelled with Ri itself', () => {
  assert.deepEqual(TICKS.map(it => it.label), ['0', '0.1', '0.25', '0.5', '1', '2', '5']);
  assert.ok(Math.abs(TICKS[1].q - 0.29) < 0.005);
});

test('every number has exactly one band and an edge belongs to the quieter one', () => {
  assert.equal(BANDS[bandOf(0.25)].label, '0.25 to 0.5');
  assert.equal(BANDS[bandOf(0.2499)].label, '0.1 to 0.25');
  assert.equal(BANDS[bandOf(0)].label, '0 to 0.1');
  assert.equal(BANDS[bandOf(-0.001)].label, '< 0');
  assert.equal(BANDS[bandOf(Infinity)].label, '≥ 5');
  assert.equal(bandOf(null), -1);
  assert.equal(bandOf(NaN), -1);
  for (let ri = -2; ri < 8; ri += 0.013) {
    assert.equal(BANDS.filter(it => ri >= it.from && ri < it.until).length, 1);
  }
});
