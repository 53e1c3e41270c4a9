import { test } from 'node:test';
import assert from 'node:assert/strict';
import { epochMinute } from '../shared/lib/utc.js';
import { prepareColumns } from './columns.js';
import { readOutParts, spoken, valuesAt } from './read-out.js';
import { boxesOf } from './segments.js';

const AT = epochMinute('2031-03-12T11:42Z');

function display(over = {}) {
  return {
    columns: prepareColumns([{
      soundingId: 's', version: 1, nominalAt: '2031-03-12T12:00:00Z', launchedAt: '2031-03-12T11:15:00Z',
      carriedUntil: '2031-03-12T18:00:00Z', notAnalysed: null,
      levels: {
        flightLevel: [280, 290, 300], heightM: [8400, 8690, 9000], minute: [AT - 2, AT, AT + 2],
        richardson: [0.6, 0.17, 0.6], shearKtPer1000Ft: [9, 16.8, 9], n2PerS2: [1.2e-4, 1.5e-4, 1.2e-4],
      },
    }]),
    boxes: boxesOf([{ forecastId: 'f', number: 2, version: 1, label: 'SLF 02', intensity: 'MOD', filedAt: '2031-03-12T07:40Z', validFrom: '2031-03-12T09:00Z',
      validUntil: '2031-03-12T13:00Z', baseFlightLevel: 270, topFlightLevel: 310, superseded: false, cancelled: false }], epochMinute),
    reports: [{ reportId: 'r', label: 'R25', intensity: 'SEV', minute: AT, flightLevel: 290, distanceNm: 0 }],
    ...over,
  };
}

test('the line has time, level, height, pressure, Ri with its window, and what is near', () => {
  const parts = readOutParts(valuesAt(display(), AT, 290), 200);
  // 315 hPa: ICAO standard atmosphere at FL290, 314.85
  assert.deepEqual(parts, [
    '12 MAR 1142Z FL290 (8.69 km, 315 hPa)', 'Ri 0.17 200 m', 'shear 16.8 kt/1000 ft', 'N² 1.5e\u22124',
    'sounding 12 MAR 1200Z', 'SLF 02 inside', 'nearest report R25 SEV 0 min 0 ft 0 NM',
  ]);
});

test('a carried value says so, and where nothing is known that is said', () => {
  assert.ok(readOutParts(valuesAt(display(), AT + 200, 290), 200).includes('carried from 12 MAR 1200Z'));
  const parts = readOutParts(valuesAt(display({ boxes: [], reports: [] }), AT - 300, 290), 200);
  assert.deepEqual(parts.slice(1), ['no sounding here', 'no forecast']);
});

test('a cancellation holds nothing', () => {
  const at = display();
  at.boxes = at.boxes.map(box => ({ ...box, cancelled: true }));
  assert.deepEqual(valuesAt(at, AT, 290).boxes, []);
});

test('the spoken text is one sentence of whole words', () => {
  const text = spoken(valuesAt(display(), AT, 290), 200);
  assert.match(text, /flight level 290; Richardson number 0\.17 at a 200 metre window; inside SLF 02, moderate/);
  assert.match(text, /nearest report R25, severe, 0 minutes away\.$/);
});
