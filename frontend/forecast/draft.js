/*
 * The form of a draft. Ctrl+Enter goes to the check page, never straight to issue; a field that was filled by the desk
 * loses its mark as soon as it is touched. The form works without this.
 */
export function mount(root) {
  const form = root.querySelector('form.fields[action*="/forecasts"]');
  if (!form) return;
  form.addEventListener('keydown', event => {
    if (event.key !== 'Enter' || !(event.ctrlKey || event.metaKey)) return;
    event.preventDefault();
    form.querySelector('button[value="check"]').click();
  });
  form.addEventListener('input', event => {
    event.target.closest('.field')?.querySelector(':scope > .prefilled')?.remove();
  });
}
