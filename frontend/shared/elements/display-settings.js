/*
 * Theme and brightness. Both are kept in cookies, so that the server writes them on <html> before the first paint
 * and no page flashes. Buttons: data-set-theme="dark|light", data-set-brightness="day|evening|night".
 */
const CHOICES = { theme: ['dark', 'light'], brightness: ['day', 'evening', 'night'] };
const STANDARD = { theme: 'dark', brightness: 'day' };

export function mount(root) {
  const html = root.documentElement;
  for (const [name, allowed] of Object.entries(CHOICES)) {
    const key = `set${name[0].toUpperCase()}${name.slice(1)}`;
    const buttons = [...root.querySelectorAll(`[data-set-${name}]`)];
    const show = () => {
      const now = html.dataset[name] ?? STANDARD[name];
      for (const button of buttons) button.setAttribute('aria-pressed', String(button.dataset[key] === now));
    };
    for (const button of buttons) {
      button.addEventListener('click', () => {
        const value = button.dataset[key];
        if (!allowed.includes(value)) return;
        html.dataset[name] = value;
        root.cookie = `shearbook-${name}=${value}; path=/; max-age=31536000; SameSite=Lax`;
        show();
        root.dispatchEvent(new CustomEvent('shearbook:colours'));
      });
    }
    show();
  }
}
