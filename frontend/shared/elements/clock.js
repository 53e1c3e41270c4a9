/*
 * The desk's clock. The desk may run on a clock of its own (the demonstration does), so the page counts on from the
 * moment the server wrote instead of asking the computer what time it is.
 */
import { clockText } from '../lib/utc.js';

export function mount(root) {
  const started = performance.now();
  for (const cell of root.querySelectorAll('[data-clock]')) {
    const written = Date.parse(cell.getAttribute('datetime') ?? '');
    if (Number.isNaN(written)) continue;
    const show = () => {
      const now = new Date(written + performance.now() - started);
      cell.textContent = clockText(now);
      cell.setAttribute('datetime', now.toISOString());
    };
    show();
    setInterval(show, 1000);
  }
}

/** The desk's present moment in milliseconds since 1970, or null where the page has no clock. */
export function deskTime(root) {
  const cell = root.querySelector('[data-clock]');
  const at = cell ? Date.parse(cell.getAttribute('datetime')) : NaN;
  return Number.isNaN(at) ? null : at;
}
