import { test } from 'node:test';
import assert from 'node:assert/strict';
import {
  fixed, feetToMetres, kilometresText, knotsToMs, metresToFeet, n2Text, PER_SECOND_PER_KT_PER_1000_FT, pressureText,
  richardsonText,
} from './units.js';

test('Ri has two decimals below 1, one to 10, and is cut off above', () => {
  assert.equal(richardsonText(0.17), '0.17');
  assert.equal(richardsonText(0.994), '0.99');
  assert.equal(richardsonText(0.996), '1.0');
  assert.equal(richardsonText(1.04), '1.0');
  assert.equal(richardsonText(9.96), '10.0');
  assert.equal(richardsonText(10.01), '>10');
  assert.equal(richardsonText(-0.2), 'overturned');
});

test('what is missing is a dash and never zero', () => {
  for (const missing of [null, undefined, NaN, Infinity, '0']) {
    assert.equal(richardsonText(missing), '\u2013');
    assert.equal(fixed(missing, 1), '\u2013');
    assert.equal(kilometresText(missing), '\u2013');
  }
});

test('minus is a true minus, never before a rounded zero, and thousands have a thin space', () => {
  assert.equal(fixed(-3.25, 1), '\u22123.3');
  assert.equal(fixed(-0.04, 1), '0.0');
  assert.equal(fixed(12345, 0), '12\u2009345');
  assert.equal(fixed(1234, 0), '1234');
});

test('N² has two significant figures', () => {
  assert.equal(n2Text(0.00015), '1.5e\u22124');
  assert.equal(n2Text(-0.0000204), '\u22122.0e\u22125');
});

test('pressure shows tenths above the 100 hPa level', () => {
  assert.equal(pressureText(315.4), '315 hPa');
  assert.equal(pressureText(70.04), '70.0 hPa');
});

// exact: 1 kt = 0.514444 m/s and 1 ft = 0.3048 m by definition; 1.688e-3 is the handbook figure of the shear unit
test('units turn into each other', () => {
  assert.equal(feetToMetres(1000), 304.8);
  assert.equal(metresToFeet(304.8), 1000);
  assert.equal(knotsToMs(100), 51.4444);
  assert.ok(Math.abs(PER_SECOND_PER_KT_PER_1000_FT - 1.688e-3) < 5e-7);
});
