// What the design page needs of the browser: fields and dimensions tied together, room for the drawing, keys, read-outs.
// Listeners hang on the document and ask for the page, because the server paints its parts anew.
let page = null;
let watching = [];
const root = () => document.querySelector('[data-design]');

export function start(reference) {
  stop();
  page = reference;
  const events = { focusin, focusout, click, keydown, input, pointermove: point, pointerleave: clear };
  for (const [name, handler] of Object.entries(events)) {
    document.addEventListener(name, handler, name === 'pointerleave');
    watching.push(() => document.removeEventListener(name, handler, name === 'pointerleave'));
  }
  const painted = new MutationObserver(changes => {
    if (changes.some(c => c.type === 'childList')) { dress(); room(); reveal(); }
    if (changes.some(c => c.attributeName === 'data-answered')) answered();
  });
  painted.observe(document.querySelector('main'), { childList: true, subtree: true, attributes: true, attributeFilter: ['data-answered'] });
  const sized = new ResizeObserver(() => room());
  sized.observe(document.body);
  const scrolled = () => pin();
  addEventListener('scroll', scrolled, { passive: true });
  addEventListener('resize', scrolled, { passive: true });
  watching.push(() => painted.disconnect(), () => sized.disconnect(), () => { removeEventListener('scroll', scrolled); removeEventListener('resize', scrolled); });
  dress();
  room();
  pin();
}

export function stop() {
  watching.forEach(end => end());
  watching = [];
  page = null;
}

export function focusFirstError() {
  const field = document.querySelector('.fields [aria-invalid=true], .fields [aria-required=true]:placeholder-shown');
  field?.scrollIntoView({ block: 'center' });
  field?.focus();
}

// ---- room -----------------------------------------------------------------------------------------------------------
let told = '';
let waiting = 0;
function room() {
  clearTimeout(waiting);
  waiting = setTimeout(() => {
    const paper = document.querySelector('[data-drawing]');
    if (!paper || !page) return;
    const width = Math.floor(paper.clientWidth);
    // Side by side the drawing fills the window; stacked it takes its shape from its width.
    const top = paper.getBoundingClientRect().top + scrollY;
    const stacked = matchMedia('(max-width: 899px)').matches;
    const height = stacked ? Math.round(width * 0.86) : Math.floor(innerHeight - top - 12);
    const plot = document.querySelector('[data-evidence] .fig');
    const chart = plot ? Math.floor(plot.clientWidth) : 0;
    const now = [width, height, chart || 304].join();
    if (width > 0 && now !== told) {
      told = now;
      page.invokeMethodAsync('OnRoom', width, height, chart || 304);
    }
  }, 60);
}

function pin() {
  const paper = document.querySelector('[data-drawing] .front');
  root()?.classList.toggle('past', !!paper && paper.getBoundingClientRect().bottom < 96);
}

// ---- fields and dimensions ------------------------------------------------------------------------------------------
let lit = null;
const dims = key => [...document.querySelectorAll('[data-drawing] [data-field]')].filter(g => g.dataset.field === key);

function dress() {
  for (const dim of document.querySelectorAll('[data-drawing] [data-field]:not([tabindex])')) {
    dim.setAttribute('tabindex', '0');
    dim.setAttribute('role', 'button');
    const words = dim.querySelector('title')?.textContent ?? '';
    dim.setAttribute('aria-label', `${words}. Press to edit.`);
  }
  // The picture holds buttons, so it is a group, not an image.
  for (const svg of document.querySelectorAll('[data-drawing] svg[role=img]')) if (svg.querySelector('[data-field]')) svg.setAttribute('role', 'group');
  light(lit);
}

function light(key) {
  document.querySelectorAll('[data-drawing] .lit').forEach(g => g.classList.remove('lit'));
  if (key) dims(key).forEach(g => g.classList.add('lit'));
}

// A message that appears under the field one types in must not lie below the edge.
function reveal() {
  const message = document.activeElement?.closest?.('.fields .f')?.nextElementSibling;
  if (message?.matches('.msg')) message.scrollIntoView({ block: 'nearest' });
}

let before = '';
function focusin(event) {
  const field = event.target;
  if (!field.closest?.('.fields')) return;
  before = field.value ?? '';
  lit = field.id || null;
  light(lit);
}

function focusout(event) {
  if (event.target.id === lit) { lit = null; light(null); }
}

function edit(key) {
  const field = document.getElementById(key) ?? document.getElementById(key.replace(/\[.*$/, ''));
  if (!field) return false;
  field.scrollIntoView({ block: 'nearest' });
  field.focus();
  field.select?.();
  return true;
}

function click(event) {
  const dim = event.target.closest?.('[data-drawing] [data-field]');
  if (dim) return edit(dim.dataset.field);
  const wanted = event.target.closest?.('[data-focus]');
  if (wanted) return edit(wanted.dataset.focus);
}

// ---- keys -----------------------------------------------------------------------------------------------------------
function keydown(event) {
  const at = event.target;
  if ((event.key === 'Enter' || event.key === ' ') && at.matches?.('[data-drawing] [data-field]')) {
    event.preventDefault();
    edit(at.dataset.field);
    return;
  }
  if (at.matches?.('[data-hover]')) return step(event, at);
  const mod = event.ctrlKey || event.metaKey;
  if (!mod || event.altKey || document.querySelector('dialog[open]')) return;
  const key = event.key.toLowerCase();
  if (key === 's' && !event.shiftKey) {
    const save = document.querySelector('[data-save]');
    if (!save) return;
    event.preventDefault();
    save.click();
    return;
  }
  const undo = key === 'z' && !event.shiftKey;
  const redo = (key === 'z' && event.shiftKey) || key === 'y';
  if (!undo && !redo) return;
  // In a field that is half typed the browser's own undo goes letter by letter.
  if (at.matches?.('input[type=text], textarea') && at.value !== before) return;
  event.preventDefault();
  document.querySelector(undo ? '[data-undo]:not(:disabled)' : '[data-redo]:not(:disabled)')?.click();
}

// ---- how long an answer takes ---------------------------------------------------------------------------------------
let typed = 0;
function input(event) {
  if (event.target.closest?.('.fields')) typed = performance.now();
}

function answered() {
  if (!typed) return;
  const from = typed;
  typed = 0;
  requestAnimationFrame(() => performance.measure('design-answer', { start: from, end: performance.now() }));
}

// ---- read-outs ------------------------------------------------------------------------------------------------------
const models = new WeakMap();
function model(plot) {
  const text = plot.dataset.hover;
  let known = models.get(plot);
  if (known?.text !== text) models.set(plot, known = { text, ...JSON.parse(text), at: null });
  return known;
}

const map = (axis, v, from, span) => from + span * (axis.log
  ? (Math.log(v) - Math.log(axis.low)) / (Math.log(axis.high) - Math.log(axis.low))
  : (v - axis.low) / (axis.high - axis.low));

function place(m, series, i) {
  const { plot, x } = m.chart;
  return { px: map(x, series.x[i], plot.x, plot.width), py: plot.y + plot.height - map(series.axis, series.y[i], 0, plot.height) };
}

function point(event) {
  const plot = event.target.closest?.('[data-hover]');
  document.querySelectorAll('[data-hover] .cursor').forEach(c => { if (c.closest('[data-hover]') !== plot && document.activeElement !== c.closest('[data-hover]')) wipe(c.closest('[data-hover]')); });
  if (!plot || !plot.dataset.hover) return;
  const svg = plot.querySelector('svg');
  const box = svg.getBoundingClientRect();
  const m = model(plot);
  const px = (event.clientX - box.left) * m.size[0] / box.width;
  const py = (event.clientY - box.top) * m.size[1] / box.height;
  if (m.chart.series.length === 0) return;
  const first = m.chart.series[0];
  let best = 0, least = Infinity;
  for (let i = 0; i < first.x.length; i++) {
    const p = place(m, first, i);
    const d = m.chart.byPoint ? (p.px - px) ** 2 + (p.py - py) ** 2 : Math.abs(p.px - px);
    if (d < least) { least = d; best = i; }
  }
  show(plot, m, best);
}

function clear(event) {
  if (event.target.matches?.('[data-hover]') && document.activeElement !== event.target) wipe(event.target);
}

function wipe(plot) {
  plot.querySelector('.cursor')?.remove();
  plot.querySelector('.read').textContent = '';
}

function step(event, plot) {
  const m = model(plot);
  const n = m.chart.series[0]?.x.length ?? 0;
  if (n === 0 || !['ArrowLeft', 'ArrowRight', 'Home', 'End', 'Escape'].includes(event.key)) return;
  event.preventDefault();
  if (event.key === 'Escape') return wipe(plot);
  const stride = Math.max(1, Math.round(n / 64));
  const now = m.at ?? 0;
  const next = { ArrowLeft: now - stride, ArrowRight: now + stride, Home: 0, End: n - 1 }[event.key];
  show(plot, m, Math.min(n - 1, Math.max(0, next)));
}

const figure = v => (Math.abs(v) >= 1000 ? v.toFixed(0) : Number(v.toPrecision(3)).toString()).replace('-', '\u2212');

function show(plot, m, i) {
  m.at = i;
  const svg = plot.querySelector('svg');
  svg.querySelector('.cursor')?.remove();
  const make = (name, attributes) => {
    const e = document.createElementNS('http://www.w3.org/2000/svg', name);
    for (const [k, v] of Object.entries(attributes)) e.setAttribute(k, v);
    return e;
  };
  const g = make('g', { class: 'cursor' });
  const box = m.chart.plot;
  const first = m.chart.series[0];
  const x = first.x[Math.min(i, first.x.length - 1)];
  if (!m.chart.byPoint) {
    const px = map(m.chart.x, x, box.x, box.width);
    g.append(make('line', { x1: px, x2: px, y1: box.y, y2: box.y + box.height }));
  }
  const words = [];
  for (const s of [...m.chart.series].sort((a, b) => (a.name < b.name ? -1 : 1))) {
    // Series may be sampled apart: each reads at its own nearest point.
    const k = s.x.length === first.x.length ? i : s.x.reduce((b, v, j) => (Math.abs(v - x) < Math.abs(s.x[b] - x) ? j : b), 0);
    const p = place(m, s, k);
    if (Number.isFinite(p.px) && p.py >= box.y - 1 && p.py <= box.y + box.height + 1) g.append(make('circle', { cx: p.px, cy: p.py, r: 3 }));
    words.push(`${m.chart.series.length > 1 || m.chart.byPoint ? s.name + ' ' : ''}${figure(s.y[k])} ${s.unit}`.trim());
  }
  svg.append(g);
  plot.querySelector('.read').textContent = `${figure(x)} ${m.chart.xUnit}: ${words.join(', ')}`.replace(' :', ':');
}
