import { test } from 'node:test';
import assert from 'node:assert/strict';
import { clockText, dayHhmmZ, epochMinute, hhmmZ, isoMinute, shortMoment, spanText, timeTicks } from './utc.js';

const AT = '2031-03-12T11:42:07Z';

test('a moment is written as hours and minutes with Z, seconds cut', () => {
  assert.equal(hhmmZ(AT), '1142Z');
  assert.equal(hhmmZ('2031-03-12T23:59:59.999Z'), '2359Z');
  assert.equal(dayHhmmZ(AT), '12 MAR 1142Z');
  assert.equal(clockText(AT), '12 MAR 1142:07Z');
});

test('the date is shown only when it is not today', () => {
  assert.equal(shortMoment(AT, '2031-03-12T23:00Z'), '1142Z');
  assert.equal(shortMoment(AT, '2031-03-13T00:10Z'), '12 MAR 1142Z');
  assert.equal(shortMoment(AT, '2032-03-12T12:00Z'), '12 MAR 1142Z');
});

test('text that is no moment is refused with the text in the message', () => {
  assert.throws(() => hhmmZ('half past'), /half past/);
});

test('epoch minutes and the form text are inverse to the minute', () => {
  assert.equal(isoMinute(epochMinute('2031-03-12T11:42Z')), '2031-03-12T11:42Z');
  assert.equal(epochMinute('1970-01-02T00:00:30Z'), 1440.5);
});

test('spans are words with a true minus', () => {
  assert.equal(spanText(124), '2 h 04 min');
  assert.equal(spanText(37), '37 min');
  assert.equal(spanText(-5), '\u22125 min');
  assert.equal(spanText(-0.2), '0 min');
  assert.equal(spanText(3 * 1440 + 150), '3 d 2 h');
});

test('ticks fall on round UTC hours with the date under midnight', () => {
  const from = epochMinute('2031-03-11T18:00Z');
  const ticks = timeTicks(from, from + 1440, 4);
  assert.deepEqual(ticks.map(it => it.label), ['18Z', '00Z', '06Z', '12Z', '18Z']);
  assert.deepEqual(ticks.map(it => it.date), [null, '12 MAR', null, null, null]);
});

test('ticks of every span stay within their number plus the first one and inside the span', () => {
  for (const span of [37, 60, 301, 720, 1440, 4320, 43200, 525600]) {
    for (const most of [1, 4, 9, 20]) {
      const from = epochMinute('2031-03-11T17:13Z');
      const ticks = timeTicks(from, from + span, most);
      assert.ok(ticks.length <= most + 1, `${ticks.length} ticks for ${span} min, at most ${most}`);
      assert.ok(ticks.every(it => it.minute >= from && it.minute <= from + span));
    }
  }
  assert.deepEqual(timeTicks(10, 10, 5), []);
});
