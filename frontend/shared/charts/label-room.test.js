import { test } from 'node:test';
import assert from 'node:assert/strict';
import { labelRoom } from './label-room.js';

test('a label gives way to one already there and is left out where no place is free', () => {
  const room = labelRoom();
  assert.equal(room.take(0, [100, 82], 50, 18), 100);
  assert.equal(room.take(20, [100, 82], 50, 18), 82);
  assert.equal(room.take(20, [100], 50, 18), null);
  room.claim(100, 0, 50, 200);
  assert.equal(room.take(120, [100, 46], 10, 18), null);
  assert.equal(room.take(150, [100], 10, 18), 100);
});
