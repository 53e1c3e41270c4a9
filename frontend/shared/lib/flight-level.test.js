import { test } from 'node:test';
import assert from 'node:assert/strict';
import { flightLevelText, levelDifferenceText, pressureOfFlightLevel } from './flight-level.js';

test('a flight level always has three figures', () => {
  assert.equal(flightLevelText(290), 'FL290');
  assert.equal(flightLevelText(7.4), 'FL007');
  assert.equal(flightLevelText(0), 'FL000');
  assert.equal(flightLevelText(-2), 'FL\u221202');
  assert.equal(flightLevelText(null), '\u2013');
});

// published: the usual table of pressure levels and their ICAO standard heights in feet, from memory:
// 850 hPa 4781 ft, 500 hPa 18289 ft, 300 hPa 30065 ft, 200 hPa 38662 ft, 100 hPa 53083 ft
test('the pressure of a level is that of the standard atmosphere', () => {
  const table = [[850, 4781], [500, 18289], [300, 30065], [200, 38662], [100, 53083]];
  for (const [hPa, feet] of table) {
    assert.ok(Math.abs(pressureOfFlightLevel(feet / 100) - hPa) < 0.02, `${hPa} hPa at ${feet} ft`);
  }
  assert.equal(pressureOfFlightLevel(0), 1013.25);
});

test('a difference of levels is in feet with its sign', () => {
  assert.equal(levelDifferenceText(294, 290), '+400 ft');
  assert.equal(levelDifferenceText(278, 290), '\u22121200 ft');
  assert.equal(levelDifferenceText(290.2, 290), '0 ft');
});
