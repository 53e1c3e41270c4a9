/*
 * In a table marked data-rows the up and down arrows move between lines and Enter opens the line's first link. The
 * link itself is what has the focus, so the table works the same for a screen reader.
 */
export function mount(root) {
  for (const table of root.querySelectorAll('[data-rows]')) {
    table.addEventListener('keydown', event => {
      const step = { ArrowDown: 1, ArrowUp: -1 }[event.key];
      if (!step || event.altKey || event.ctrlKey || event.metaKey || event.target.matches('input, select, textarea')) return;
      const rows = [...table.querySelectorAll('tbody tr')].filter(row => row.querySelector('a[href], button'));
      const at = rows.indexOf(event.target.closest('tr'));
      const next = rows[at + step];
      if (at < 0 || !next) return;
      event.preventDefault();
      next.querySelector('a[href], button').focus();
    });
  }
}
