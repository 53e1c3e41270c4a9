/*
 * The colours a canvas draws with. They are the custom properties of tokens.css as they stand on an element now, so
 * a canvas follows theme and brightness; on paper everything is black on white and bands are told by pattern.
 */
import { BANDS } from '../lib/quarter-scale.js';

const INKS = ['page', 'panel', 'text', 'second', 'line', 'hair', 'focus', 'mark', 'mark-halo'];

export function screenPalette(element) {
  const style = getComputedStyle(element);
  const read = name => style.getPropertyValue(name).trim();
  const palette = { print: false, fontText: read('--font-text'), fontLabel: read('--font-label') };
  for (const ink of INKS) palette[ink === 'mark-halo' ? 'halo' : ink] = read(`--${ink}`);
  palette.bands = BANDS.map(band => rgb(read(band.token)));
  palette.overturnedTick = rgb(read('--ri-overturned-tick'));
  return palette;
}

export function printPalette(element) {
  const style = getComputedStyle(element);
  return {
    print: true,
    fontText: style.getPropertyValue('--font-text').trim(),
    fontLabel: style.getPropertyValue('--font-label').trim(),
    page: '#ffffff', panel: '#ffffff', text: '#000000', second: '#000000', line: '#000000', hair: '#999999',
    focus: '#000000', mark: '#000000', halo: '#ffffff',
    bands: BANDS.map(() => [0, 0, 0]),
    overturnedTick: [255, 255, 255],
  };
}

/** `#e27760` as `[226, 119, 96]`. */
export function rgb(hex) {
  const found = /^#([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})$/i.exec(hex);
  if (!found) throw new Error(`not a colour of six figures: "${hex}"`);
  return found.slice(1).map(pair => parseInt(pair, 16));
}
