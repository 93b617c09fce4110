// What a person could not read on this page: text cut off, outside its box or its window, or lying over other text.
// Answers a list of plain findings; empty is good. The page as it stands is measured, nothing is changed.
() => {
  const findings = new Set();
  const width = document.documentElement.clientWidth;
  const say = (what, text) => findings.add(`${what}: "${text.trim().replace(/\s+/g, ' ').slice(0, 60)}"`);
  const styles = new Map();
  const style = e => styles.get(e) ?? styles.set(e, getComputedStyle(e)).get(e);
  const chain = function* (e) { for (; e; e = e.parentElement) yield e; };
  const name = e => e.tagName.toLowerCase() + (e.id ? `#${e.id}` : e.getAttribute('class') ? `.${e.getAttribute('class').split(' ')[0]}` : '');
  const slack = 1.5;

  if (document.documentElement.scrollWidth > width) findings.add(`the page scrolls sideways: ${document.documentElement.scrollWidth} px in ${width} px`);

  // With a dialog open, the dialog is what there is to read.
  const scope = document.querySelector('dialog[open]') ?? document.body;
  const shown = e => e.checkVisibility({ opacityProperty: true, visibilityProperty: true, contentVisibilityAuto: true })
    && ![...chain(e)].some(a => style(a).clipPath === 'inset(50%)' || a.classList.contains('skip'));

  // ---- text in boxes
  const texts = [];
  const walker = document.createTreeWalker(scope, NodeFilter.SHOW_TEXT);
  while (walker.nextNode()) {
    const node = walker.currentNode;
    const host = node.parentElement;
    if (!node.data.trim() || host.closest('svg, script, style, select, textarea') || !shown(host)) continue;
    const range = document.createRange();
    range.selectNodeContents(node);
    let rects = [...range.getClientRects()].filter(r => r.width > 0 && r.height > 0);
    if (rects.length === 0) continue;
    let titled = false;
    let rolls = false; // inside a box that scrolls sideways: what is outside can be reached
    let block = null;
    for (const a of chain(host)) {
      const s = style(a);
      const box = a.getBoundingClientRect();
      titled ||= a.title.length > 0;
      // A line that is shortened on purpose, with dots, says the whole of it in its title.
      if (titled && s.textOverflow === 'ellipsis' && s.overflowX === 'hidden') rects = rects.map(r => new DOMRect(r.x, r.y, Math.min(r.right, box.right) - r.x, r.height)).filter(r => r.width > 0);
      if (!block && !s.display.startsWith('inline') && s.display !== 'contents') {
        block = a;
        if (!rolls && rects.some(r => r.right > box.right + slack || r.left < box.left - slack)) say(`reaches out of ${name(a)}`, node.data);
      }
      // Rows that a list has rolled out of its frame lie over nothing.
      if (['auto', 'scroll'].includes(s.overflowY) && a !== document.body && a !== document.documentElement) rects = rects.filter(r => r.bottom > box.top && r.top < box.bottom);
      if (['auto', 'scroll'].includes(s.overflowX) && a !== document.body && a !== document.documentElement) { rolls = true; break; }
      if (['hidden', 'clip'].includes(s.overflowX) && rects.some(r => r.right > box.right + slack || r.left < box.left - slack)) say(`cut off at the side of ${name(a)}`, node.data);
      if (['hidden', 'clip'].includes(s.overflowY) && rects.some(r => r.bottom > box.bottom + 3 || r.top < box.top - 3)) say(`cut off at the foot of ${name(a)}`, node.data);
      if (s.position === 'fixed') break;
    }
    if (!rolls && rects.some(r => r.right > width + slack || r.left < -slack)) say('outside the window', node.data);
    texts.push({ node, host, rects });
  }

  // ---- text over text: floats apart (a sticky head, a popup) may lie over what they cover on purpose
  const floats = t => [...chain(t.host)].find(a => ['sticky', 'fixed'].includes(style(a).position) || a.popover || a.matches('.hint, .read')) ?? null;
  const lines = texts.flatMap(t => { const f = floats(t); return t.rects.map(r => ({ t, f, x0: r.left, x1: r.right, y0: r.top + r.height * 0.2, y1: r.bottom - r.height * 0.2 })); })
    .sort((a, b) => a.y0 - b.y0);
  const overlap = (all, what, apart) => {
    for (let i = 0; i < all.length; i++) {
      for (let j = i + 1; j < all.length && all[j].y0 < all[i].y1; j++) {
        const [a, b] = [all[i], all[j]];
        if (a.t !== b.t && !apart(a, b) && Math.min(a.x1, b.x1) - Math.max(a.x0, b.x0) > 1 && Math.min(a.y1, b.y1) - b.y0 > 1) {
          say(what, `${(a.t.node ?? a.t).textContent.trim()} | ${(b.t.node ?? b.t).textContent.trim()}`);
        }
      }
    }
  };
  overlap(lines, 'lies over other text', (a, b) => a.f !== b.f);

  // ---- values in fields
  const pen = document.createElement('canvas').getContext('2d');
  for (const field of scope.querySelectorAll('input, select')) {
    if (!shown(field) || ['radio', 'checkbox', 'file', 'hidden'].includes(field.type)) continue;
    const s = style(field);
    const text = field.tagName === 'SELECT' ? field.selectedOptions[0]?.textContent ?? '' : field.value || field.placeholder;
    pen.font = `${field.value ? s.fontStyle : getComputedStyle(field, '::placeholder').fontStyle} ${s.fontWeight} ${s.fontSize} ${s.fontFamily}`;
    const room = field.clientWidth - parseFloat(s.paddingLeft) - parseFloat(s.paddingRight);
    if (pen.measureText(text.trim()).width > room + slack) say(`the value is wider than its field ${name(field)}, ${Math.round(pen.measureText(text.trim()).width)} px in ${Math.round(room)} px`, text);
  }

  // ---- drawings and charts
  const drawn = [];
  for (const svg of scope.querySelectorAll('svg')) {
    if (!shown(svg)) continue;
    const frame = svg.getBoundingClientRect();
    if (frame.right > width + slack || frame.left < -slack) say('a drawing reaches out of the window', svg.querySelector('title')?.textContent ?? name(svg));
    const parent = svg.parentElement.getBoundingClientRect();
    if (frame.width > parent.width + slack) say(`a drawing is wider than its panel, ${Math.round(frame.width)} px in ${Math.round(parent.width)} px`, svg.querySelector('title')?.textContent ?? name(svg));
    const marks = [...svg.querySelectorAll('text')].filter(t => t.textContent.trim() && shown(t)).map(t => ({ t, r: t.getBoundingClientRect() }));
    for (const { t, r } of marks) {
      if (r.left < frame.left - slack || r.right > frame.right + slack || r.top < frame.top - 3 || r.bottom > frame.bottom + 3) say('outside its drawing', t.textContent);
    }
    // A letter's box is taller than its ink: a fifth above and below is air. Turned text has its air at the sides.
    const inked = marks.map(({ t, r }) => {
      const turned = r.height > r.width * 1.2 && t.textContent.trim().length > 2;
      const [dx, dy] = turned ? [r.width * 0.2, 0] : [0, r.height * 0.2];
      return { t, x0: r.left + dx, x1: r.right - dx, y0: r.top + dy, y1: r.bottom - dy };
    }).sort((a, b) => a.y0 - b.y0);
    overlap(inked, 'lies over other text in a drawing', () => false);
    const f = floats({ host: svg });
    drawn.push(...inked.map(m => ({ ...m, f })));
  }
  overlap([...lines, ...drawn].sort((a, b) => a.y0 - b.y0), 'covers text of a drawing', (a, b) => a.f !== b.f || !a.t.node === !b.t.node);
  return [...findings];
}
