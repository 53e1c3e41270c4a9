import { test } from 'node:test';
import assert from 'node:assert/strict';
import { KNOWN, traceSymbol } from './report-symbols.js';

/** Notes what is drawn instead of drawing it. */
function notebook() {
  const calls = [];
  const note = name => (...values) => { calls.push([name, ...values]); };
  return { calls, beginPath: note('begin'), moveTo: note('move'), lineTo: note('line'), arc: note('arc'), stroke: note('stroke') };
}
const count = (context, name) => context.calls.filter(it => it[0] === name).length;

test('moderate is one peak, severe two stacked peaks, nil an open circle, light a bar over a dot', () => {
  const drawn = Object.fromEntries(KNOWN.map(code => {
    const context = notebook();
    traceSymbol(context, code);
    return [code, context];
  }));
  assert.equal(count(drawn.MOD, 'move'), 1);
  assert.equal(count(drawn.MOD, 'line'), 2);
  assert.equal(count(drawn.SEV, 'move'), 2);
  assert.equal(count(drawn.SEV, 'line'), 4);
  assert.equal(count(drawn.NIL, 'arc'), 1);
  assert.equal(count(drawn.NIL, 'line'), 0);
  assert.equal(count(drawn.LGT, 'line'), 1);
  assert.equal(count(drawn.LGT, 'arc'), 1);
  assert.ok(count(drawn.EXTRM, 'line') > count(drawn.SEV, 'line'));
  assert.ok(KNOWN.every(code => count(drawn[code], 'stroke') === 1));
});

test('a symbol stays in its frame of 20 by 20 times its size', () => {
  for (const code of KNOWN) {
    const context = notebook();
    traceSymbol(context, code, 2);
    for (const [name, x, y] of context.calls) {
      if (name === 'move' || name === 'line') assert.ok(Math.abs(x) <= 20 && Math.abs(y) <= 20, `${code} ${x} ${y}`);
    }
  }
});
