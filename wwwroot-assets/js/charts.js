// Read-outs of charts: what the lines are worth under the pointer, or by arrow keys where a plot has the focus.
let watching = [];

// For a page that has nothing else to listen for.
export function watch() {
  unwatch();
  const keys = event => { if (event.target.matches?.('[data-hover]')) step(event, event.target); };
  for (const [name, handler] of Object.entries({ keydown: keys, pointermove: point, pointerleave: clear })) {
    document.addEventListener(name, handler, name === 'pointerleave');
    watching.push(() => document.removeEventListener(name, handler, name === 'pointerleave'));
  }
}

export function unwatch() {
  watching.forEach(end => end());
  watching = [];
}

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

export function point(event) {
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

export function clear(event) {
  if (event.target.matches?.('[data-hover]') && document.activeElement !== event.target) wipe(event.target);
}

function wipe(plot) {
  plot.querySelector('.cursor')?.remove();
  plot.querySelector('.read').textContent = '';
}

export function step(event, plot) {
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
