import { test } from 'node:test';
import assert from 'node:assert/strict';
import { pageValues } from './page-values.js';

const page = text => ({ getElementById: id => (id === 'box' ? { textContent: text } : null) });

test('the island is read as JSON', () => {
  assert.deepEqual(pageValues(page('{"heightM":8690}'), 'box'), { heightM: 8690 });
});

test('a missing or broken island is named in the message', () => {
  assert.throws(() => pageValues(page('{}'), 'layers'), /layers/);
  assert.throws(() => pageValues(page('{'), 'box'), /box/);
});
