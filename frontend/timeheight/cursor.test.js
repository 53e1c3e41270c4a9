import { test } from 'node:test';
import assert from 'node:assert/strict';
import { following, moved, zoomed } from './cursor.js';

const FRAME = { from: 0, until: 1440, low: 0, high: 450 };

test('arrow keys move to round minutes and levels and stop at the frame', () => {
  assert.deepEqual(moved({ minute: 702, level: 290.4 }, 'ArrowRight', false, FRAME), { minute: 705, level: 290.4 });
  assert.deepEqual(moved({ minute: 705, level: 290.4 }, 'ArrowUp', false, FRAME), { minute: 705, level: 291 });
  assert.deepEqual(moved({ minute: 705, level: 291 }, 'ArrowDown', true, FRAME), { minute: 705, level: 290 });
  assert.deepEqual(moved({ minute: 20, level: 0 }, 'ArrowLeft', true, FRAME), { minute: 0, level: 0 });
  assert.equal(moved({ minute: 0, level: 0 }, 'ArrowDown', false, FRAME).level, 0);
  assert.equal(moved({ minute: 0, level: 0 }, 'a', false, FRAME), null);
  assert.equal(moved({ minute: 3, level: 1 }, 'End', false, FRAME).minute, 1440);
});

test('zooming keeps the centre where it is and the window inside the whole', () => {
  const closer = zoomed({ from: 0, until: 1440 }, 0.5, 720, FRAME);
  assert.deepEqual(closer, { from: 360, until: 1080 });
  assert.deepEqual(zoomed(closer, 8, 720, FRAME), { from: 0, until: 1440 });
  const least = zoomed({ from: 0, until: 40 }, 0.1, 20, FRAME);
  assert.equal(least.until - least.from, 30);
});

test('the window follows a cursor that leaves it and otherwise rests', () => {
  const view = { from: 600, until: 700 };
  assert.equal(following(view, 650, FRAME), view);
  assert.deepEqual(following(view, 720, FRAME), { from: 630, until: 730 });
  assert.deepEqual(following(view, 0, FRAME), { from: 0, until: 100 });
});
