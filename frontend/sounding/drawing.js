/* Small pieces of SVG and table that the pages of soundings share. Looks are in classes: the policy forbids inline style. */
const SVG = 'http://www.w3.org/2000/svg';

export function svg(name, attributes = {}, ...children) {
  const element = document.createElementNS(SVG, name);
  for (const [key, value] of Object.entries(attributes)) element.setAttribute(key, value);
  element.append(...children);
  return element;
}

export function html(name, attributes = {}, ...children) {
  const element = document.createElement(name);
  for (const [key, value] of Object.entries(attributes)) element.setAttribute(key, value);
  element.append(...children);
  return element;
}

export function text(x, y, words, className = '', anchor = 'middle') {
  return svg('text', { x, y, class: className, 'text-anchor': anchor }, words);
}

/** A calm line instead of the drawing, with what to do. */
export function say(place, words) {
  place.replaceChildren(html('p', { class: 'empty', role: 'status' }, words));
}

/** One analysis; throws with the words of the problem where there is none. */
export async function analysisOf(id, { windowM, asKnownAt } = {}) {
  const address = new URL(`/api/v1/soundings/${encodeURIComponent(id)}/analysis`, document.baseURI);
  if (windowM) address.searchParams.set('windowM', windowM);
  if (asKnownAt) address.searchParams.set('asKnownAt', asKnownAt);
  const answer = await fetch(address, { headers: { Accept: 'application/json' } });
  if (!answer.ok) {
    const problem = await answer.json().catch(() => ({}));
    throw new Error(problem.detail ?? `The analysis could not be read (${answer.status}). Load the page again.`);
  }
  return answer.json();
}
