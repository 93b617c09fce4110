// Runs before the first paint, so that a remembered theme never flashes. "system" is the absence of a choice.
(() => {
  const root = document.documentElement;
  const order = ['system', 'light', 'dark'];
  const read = () => { try { return localStorage.getItem('theme') ?? 'system'; } catch { return 'system'; } };
  const apply = theme => {
    if (theme === 'light' || theme === 'dark') root.dataset.theme = theme; else delete root.dataset.theme;
    const button = document.getElementById('theme');
    if (button) {
      const next = order[(order.indexOf(theme) + 1) % order.length];
      button.dataset.now = theme;
      button.title = `Theme: ${theme}. Press for ${next}.`;
      button.setAttribute('aria-label', button.title);
    }
  };
  apply(read());
  addEventListener('DOMContentLoaded', () => apply(read()));
  addEventListener('storage', () => apply(read()));
  // Page updates rewrite the root element and the button; put the choice back.
  window.coreDesignTheme = () => apply(read());
  document.addEventListener('click', event => {
    if (!event.target.closest?.('#theme')) return;
    const next = order[(order.indexOf(read()) + 1) % order.length] ?? 'system';
    try { localStorage.setItem('theme', next); } catch { /* private window: the choice lasts for this page */ }
    apply(next);
  });
})();
