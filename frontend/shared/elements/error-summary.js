/** Moves the focus to the list of errors at the top of a form that came back. */
export function mount(root) {
  root.querySelector('.error-summary[data-focus]')?.focus();
}
