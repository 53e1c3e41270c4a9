/*
 * Single letters press the visible button that prints them (data-key), Alt+1 to Alt+9 open the pages of the menu in
 * their order, "?" opens the table of keys. A person can switch single letters off; the choice stays in the browser.
 */
const STORED = 'shearbook.letters';

export function mount(root) {
  const html = root.documentElement;
  html.dataset.letters = stored() === 'off' ? 'off' : 'on';

  root.addEventListener('keydown', event => {
    if (event.defaultPrevented || event.isComposing) return;
    if (event.altKey && !event.ctrlKey && !event.metaKey && /^Digit[1-9]$/.test(event.code)) {
      const link = root.querySelectorAll('.side a')[Number(event.code.slice(5)) - 1];
      if (link) { event.preventDefault(); link.click(); }
      return;
    }
    if (event.altKey || event.ctrlKey || event.metaKey || isTyping(event.target)) return;
    if (root.querySelector('dialog[open]')) return;
    // the table of keys is where letters are switched on again, so its own key always works
    if ((html.dataset.letters === 'off' && event.key !== '?') || event.key.length !== 1) return;
    const wanted = event.key.toUpperCase();
    const target = [...root.querySelectorAll('[data-key]')]
      .find(it => it.dataset.key.toUpperCase() === wanted && !it.disabled && it.getClientRects().length > 0);
    // the focus stays where the person is working
    if (target) { event.preventDefault(); target.click(); }
  });

  for (const button of root.querySelectorAll('[data-letters-switch]')) {
    const show = () => button.setAttribute('aria-pressed', String(html.dataset.letters === 'off'));
    button.addEventListener('click', () => {
      html.dataset.letters = html.dataset.letters === 'off' ? 'on' : 'off';
      try { localStorage.setItem(STORED, html.dataset.letters); } catch { /* the choice lasts for this page only */ }
      show();
    });
    show();
  }
}

function stored() {
  try { return localStorage.getItem(STORED); } catch { return null; }
}

function isTyping(element) {
  return element instanceof Element && (element.isContentEditable
    || element.matches('textarea, select, input:not([type="checkbox"], [type="radio"], [type="button"], [type="submit"])'));
}
