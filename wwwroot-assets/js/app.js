// The little that the server can't do: focus after navigation, files to disk, and plain words when the line drops.
window.coreDesign = {
  // After navigation the heading takes focus, so that a screen reader says where one is.
  focusHeading() {
    const heading = document.querySelector('main h1') ?? document.querySelector('main');
    if (!heading) return;
    heading.setAttribute('tabindex', '-1');
    heading.focus({ preventScroll: true });
  },
  // From now on presses and keys are answered; before, the page is a picture of itself.
  live() { document.documentElement.dataset.live = 'true'; },
  // Focus a field and select what is in it; used where a dimension on a drawing is pressed.
  focusField(id) {
    const field = document.getElementById(id);
    field?.focus();
    field?.select?.();
  },
  // Mark a line of a long text, from 1, and bring it into view.
  showLine(id, line) {
    const field = document.getElementById(id);
    if (!field) return;
    const lines = field.value.split('\n');
    const from = lines.slice(0, line - 1).reduce((sum, l) => sum + l.length + 1, 0);
    field.focus();
    field.setSelectionRange(from, from + (lines[line - 1] ?? '').length);
    field.scrollTop = (line - 4) * parseFloat(getComputedStyle(field).lineHeight);
    field.scrollLeft = 0;
  },
  showDialog(dialog) { if (!dialog.open) dialog.showModal(); },
  closeDialog(dialog) { dialog.close(); },
  // Small conveniences of one person at one browser, such as the name one saves under; never anything that matters.
  remember(key, value) { try { localStorage.setItem(`coredesign.${key}`, value); } catch { /* private window */ } },
  remembered(key) { try { return localStorage.getItem(`coredesign.${key}`); } catch { return null; } },
  saveText(name, type, text) {
    const link = document.createElement('a');
    link.href = URL.createObjectURL(new Blob([text], { type }));
    link.download = name;
    link.click();
    setTimeout(() => URL.revokeObjectURL(link.href), 1000);
  },
};

// Arrow keys step a number (ten steps with Shift), from the derived value where the field is empty.
// Decimal point or comma stays as it was typed.
document.addEventListener('keydown', event => {
  const field = event.target;
  const up = event.key === 'ArrowUp';
  if ((!up && event.key !== 'ArrowDown') || event.altKey || event.ctrlKey || field.readOnly || !field.matches?.('input[data-step]')) return;
  event.preventDefault();
  const text = (field.value || field.placeholder).replace(/\s/g, '').replace('\u2212', '-');
  const now = Number(text.replace(',', '.'));
  if (text === '' || !Number.isFinite(now)) return;
  const step = Number(field.dataset.step) * (event.shiftKey ? 10 : 1);
  const decimals = Math.max(...[text, field.dataset.step].map(t => (t.split(/[.,]/)[1] ?? '').length));
  const next = (now + (up ? step : -step)).toFixed(Math.min(decimals, 12));
  field.value = text.includes(',') ? next.replace('.', ',') : next;
  field.dispatchEvent(new Event('input', { bubbles: true }));
});

const banner = document.getElementById('components-reconnect-modal');
banner?.addEventListener('components-reconnect-state-changed', async event => {
  const state = event.detail.state;
  if (state === 'show' || state === 'retrying') banner.showPopover?.();
  if (state === 'hide') banner.hidePopover?.();
  if (state === 'rejected') location.reload();
});
banner?.querySelector('button')?.addEventListener('click', async () => {
  try {
    if (!await Blazor.reconnect() && !await Blazor.resumeCircuit?.()) location.reload();
  } catch { location.reload(); }
});
addEventListener('visibilitychange', () => {
  if (document.visibilityState === 'visible' && banner?.classList.contains('components-reconnect-failed')) banner.querySelector('button').click();
});
