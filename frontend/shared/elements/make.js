import { mainGrade } from '../lib/intensity.js';

/** Builds an element: make('p', { className: 'empty', dataset: {…} }, 'text', child, …). Text is never read as HTML. */
export function make(name, properties = {}, ...children) {
  const element = document.createElement(name);
  for (const [key, value] of Object.entries(properties)) {
    if (value === null || value === undefined) continue;
    if (key === 'dataset') Object.assign(element.dataset, value);
    else if (key in element) element[key] = value;
    else element.setAttribute(key, value);
  }
  element.append(...children.filter(child => child !== null && child !== undefined && child !== false && child !== ''));
  return element;
}

const SVG = 'http://www.w3.org/2000/svg';
const SYMBOL = { NIL: 'nil', LGT: 'light', MOD: 'moderate', SEV: 'severe', EXTRM: 'extreme' };

/** The symbol of an intensity as in the display, from symbols.svg; hidden from readers, the word stands beside it. */
export function symbol(intensity) {
  const svg = document.createElementNS(SVG, 'svg');
  svg.setAttribute('class', 'mark');
  svg.setAttribute('aria-hidden', 'true');
  const use = document.createElementNS(SVG, 'use');
  use.setAttribute('href', new URL(`../symbols.svg#${SYMBOL[mainGrade(intensity)] ?? 'nil'}`, import.meta.url).href);
  svg.append(use);
  return svg;
}
