import { test } from 'node:test';
import assert from 'node:assert/strict';
import { heavierFirst, intensityWord, isOccasionallySevere, mainGrade } from './intensity.js';

test('grades have their words, and what is not stated is said', () => {
  assert.equal(intensityWord('SEV'), 'severe');
  assert.equal(intensityWord('MOD_OCNL_SEV'), 'moderate, occasionally severe');
  assert.equal(intensityWord(null), 'not stated');
});

test('occasionally severe is drawn as moderate with a mark of its own', () => {
  assert.equal(mainGrade('MOD_OCNL_SEV'), 'MOD');
  assert.equal(mainGrade('SEV'), 'SEV');
  assert.deepEqual(['MOD', 'MOD_OCNL_SEV', 'SEV'].map(isOccasionallySevere), [false, true, false]);
});

test('the heavier grade sorts first', () => {
  assert.deepEqual(['NIL', 'SEV', 'LGT', 'EXTRM', 'MOD'].sort(heavierFirst), ['EXTRM', 'SEV', 'MOD', 'LGT', 'NIL']);
});
