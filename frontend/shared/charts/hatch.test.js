import { test } from 'node:test';
import assert from 'node:assert/strict';
import { carried, overturnedTick, printed } from './hatch.js';

const share = ink => {
  let count = 0;
  for (let x = 0; x < 360; x++) for (let y = 0; y < 360; y++) if (ink(x / 2, y / 2)) count++;
  return count / 360 / 360;
};

test('a carried column loses ink evenly with age, from three quarters to an eighth', () => {
  assert.ok(Math.abs(share((x, y) => carried(0, x, y)) - 0.75) < 0.03);
  assert.ok(Math.abs(share((x, y) => carried(1, x, y)) - 0.125) < 0.03);
  assert.ok(share((x, y) => carried(0.3, x, y)) > share((x, y) => carried(0.6, x, y)));
});

test('printed bands grow darker as Ri falls', () => {
  const shares = [0, 1, 2, 3, 4, 5, 6].map(band => share((x, y) => printed(band, x, y)));
  for (let band = 1; band < shares.length; band++) {
    assert.ok(shares[band] > shares[band - 1], `${shares.map(it => it.toFixed(3))}`);
  }
});

test('the ticks of overturned air are white on a mostly solid ground', () => {
  const ticks = share(overturnedTick);
  assert.ok(ticks > 0.1 && ticks < 0.4, String(ticks));
});
