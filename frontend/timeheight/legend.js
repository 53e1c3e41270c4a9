/* What the marks and bands mean, with the window in the title. Static words; nothing here depends on a cursor. */
import { make, symbol } from '../shared/elements/make.js';
import { BANDS } from '../shared/lib/quarter-scale.js';

const SYMBOLS = [
  ['NIL', 'nil (office mark)'], ['LGT', 'light (office mark)'], ['MOD', 'moderate'], ['SEV', 'severe'],
  ['EXTRM', 'extreme (office mark)'],
];

export function legend(display) {
  const bands = [...BANDS].reverse();
  const scale = make('div', { className: 'quarter-scale', role: 'img', 'aria-label':
    'Scale of the Richardson number from overturned and 0 at the left over 0.25 in the middle to 5 and more at the right' });
  for (const band of bands) scale.append(make('span', { className: `quarter-band is${band.token.slice(1)}` }));
  const ticks = make('div', { className: 'quarter-ticks', 'aria-hidden': 'true' });
  for (const label of ['< 0', '0.1', '0.25', '0.5', '1', '2', '5']) ticks.append(make('span', {}, label));

  const marks = make('ul', { className: 'legend-marks' });
  for (const [code, words] of SYMBOLS) marks.append(make('li', {}, symbol(code), words));

  return make('div', { className: 'time-height-legend' },
    make('h3', {}, `Ri, ${display.windowM} m window`), scale, ticks,
    make('ul', { className: 'legend-lines' },
      make('li', {}, make('span', { className: 'legend-line is-critical' }), 'Ri = 0.25'),
      make('li', {}, make('span', { className: 'legend-line is-one' }), 'Ri = 1'),
      make('li', {}, make('span', { className: 'legend-line is-chain' }), 'tropopause'),
      make('li', {}, make('span', { className: 'legend-box' }), 'moderate box'),
      make('li', {}, make('span', { className: 'legend-box is-double' }), 'severe box'),
      make('li', {}, make('span', { className: 'legend-box is-broken' }), 'occasionally severe'),
      make('li', {}, make('span', { className: 'legend-box is-dotted' }), 'superseded')),
    make('h3', {}, 'Air-reports'), marks,
    make('p', { className: 'legend-note' }, 'base line: automated; dot below: in cloud; slash: not scored; above the field: a block for each release, a tick for each report'));
}
