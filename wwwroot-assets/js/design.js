// What the design page needs of the browser: fields and dimensions tied together, room for the drawing, keys; read-outs of its charts.
// Listeners hang on the document and ask for the page, because the server paints its parts anew.
import { clear, point, step } from './charts.js';

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
