/* Print and the table of keys. */
export function mount(root) {
  for (const button of root.querySelectorAll('[data-print]')) button.addEventListener('click', () => window.print());
  for (const button of root.querySelectorAll('[data-keys]')) {
    button.addEventListener('click', () => root.getElementById('key-table')?.showModal());
  }
}
