/*
 * A part of the page that keeps itself fresh: <section data-live="/address/of/the/fragment" data-live-seconds="30">.
 * It is left alone while somebody is in it, so nothing moves under the hand. When the desk cannot be reached the
 * clock cell says so in words, with the minute of the last good answer.
 */
import { hhmmZ } from '../lib/utc.js';
import { deskTime } from './clock.js';

export function mount(root) {
  for (const part of root.querySelectorAll('[data-live]')) {
    const seconds = Math.max(10, Number(part.dataset.liveSeconds) || 30);
    setInterval(() => refresh(root, part), seconds * 1000);
  }
}

let lastGood = null;

async function refresh(root, part) {
  if (root.hidden || part.contains(root.activeElement)) return;
  try {
    const answer = await fetch(part.dataset.live, { headers: { Accept: 'text/html' }, redirect: 'error' });
    if (!answer.ok) throw new Error(`status ${answer.status}`);
    const fresh = new DOMParser().parseFromString(await answer.text(), 'text/html');
    const found = part.id ? fresh.getElementById(part.id) : fresh.querySelector('[data-live]');
    if (found && !part.contains(root.activeElement)) part.replaceChildren(...found.childNodes);
    lastGood = deskTime(root);
    sayLive(root, true);
  } catch {
    sayLive(root, false);
  }
}

function sayLive(root, live) {
  const cell = root.querySelector('[data-clock]')?.closest('.top-cell');
  if (!cell) return;
  cell.classList.toggle('not-live', !live);
  const label = cell.querySelector('.top-label');
  if (!label) return;
  label.dataset.standard ??= label.textContent;
  label.textContent = live ? label.dataset.standard
    : lastGood === null ? 'NOT LIVE' : `NOT LIVE since ${hhmmZ(lastGood)}`;
}
