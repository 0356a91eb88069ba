'use strict';
// The page is whole without this script. With it: tables sort, filter and copy; exclusions fold; keys jump; a finding copies as a paragraph; verdicts under other
// levels and bounds are shown from values in the page.
(() => {
  const all = (selector, within = document) => [...within.querySelectorAll(selector)];
  const make = (tag, properties = {}, ...children) => {
    const element = Object.assign(document.createElement(tag), properties);
    element.append(...children);
    return element;
  };
  const say = make('p', { className: 'said', role: 'status' });
  document.body.append(say);
  const tell = (text) => { say.textContent = ''; setTimeout(() => { say.textContent = text; }, 30); };
  const plain = (node) => node.innerText.replace(/\s+/g, ' ').trim();

  // Copying works from a file too, where the newer way may be refused.
  const copy = async (text, what) => {
    try {
      await navigator.clipboard.writeText(text);
    } catch {
      const area = make('textarea', { value: text });
      document.body.append(area);
      area.select();
      document.execCommand('copy');
      area.remove();
    }
    tell(what + ' copied.');
  };
  const button = (text, act, label = text) => {
    const made = make('button', { type: 'button', textContent: text, onclick: act });
    made.setAttribute('aria-label', label);
    return made;
  };

  // Tables.
  const value = (cell) => {
    const full = cell.querySelector('[title]')?.title ?? plain(cell);
    const text = full.replace(/[\u202f\u00a0 ]/g, '').replace('−', '-');
    return text !== '' && Number.isFinite(Number(text)) ? Number(text) : plain(cell).toLowerCase();
  };
  const order = (a, b) => typeof a === typeof b ? (a < b ? -1 : a > b ? 1 : 0) : typeof a === 'number' ? -1 : 1;
  const sortable = (table) => all('thead th', table).forEach((heading, column) => {
    const by = make('button', { type: 'button', className: 'sort', textContent: heading.textContent });
    by.onclick = () => {
      const down = heading.getAttribute('aria-sort') === 'ascending';
      all('thead th', table).forEach((other) => other.removeAttribute('aria-sort'));
      heading.setAttribute('aria-sort', down ? 'descending' : 'ascending');
      const rows = all('tbody tr', table).map((row, at) => ({ row, at, key: value(row.cells[column]) }));
      rows.sort((a, b) => (down ? order(b.key, a.key) : order(a.key, b.key)) || a.at - b.at);
      table.tBodies[0].append(...rows.map((entry) => entry.row));
    };
    heading.replaceChildren(by);
  });
  const filterable = (table, tools) => {
    const name = plain(table.caption);
    const field = make('input', { type: 'search', placeholder: 'rows that hold …' });
    field.setAttribute('aria-label', 'Show only rows of “' + name + '” that hold');
    field.oninput = () => {
      const wanted = field.value.toLowerCase();
      const rows = all('tbody tr', table);
      rows.forEach((row) => { row.hidden = !plain(row).toLowerCase().includes(wanted) && !row.textContent.toLowerCase().includes(wanted); });
      tell(rows.filter((row) => !row.hidden).length + ' of ' + rows.length + ' rows shown.');
    };
    tools.append(field);
  };
  const tabbed = (table) => all('tr', table).filter((row) => !row.hidden)
    .map((row) => [...row.cells].map((cell) => cell.querySelector('span[title]')?.title ?? plain(cell)).join('\t')).join('\n') + '\n';
  all('.scroll table').forEach((table) => {
    const tools = make('div', { className: 'tools' });
    const name = plain(table.caption);
    if (!table.closest('.sum') && table.tBodies[0].rows.length > 1) sortable(table);
    if (table.tBodies[0].rows.length > 8) filterable(table, tools);
    tools.append(button('Copy table', () => copy(tabbed(table), 'Table'), 'Copy the table “' + name + '” as tab-separated text'));
    table.closest('.scroll').before(tools);
  });

  // One exclusion or finding as a paragraph.
  const memo = (item) => all('[data-memo]', item).map(plain).filter((text) => text !== '').map((text) => /[.?!…]$/.test(text) ? text : text + '.').join(' ');
  all('[data-memo-of]').forEach((item) => {
    const tools = make('div', { className: 'tools' });
    tools.append(button('Copy for a memo', () => copy(memo(item), 'Paragraph'), 'Copy “' + item.dataset.memoOf + '” as a paragraph for a memo'));
    (item.querySelector('.memo-place') ?? item).append(tools);
  });

  // Folding and jumping.
  const folds = all('main details');
  const bar = make('div', { className: 'tools page-tools' });
  if (folds.length > 0) {
    bar.append(
      button('Unfold all', () => { folds.forEach((fold) => { fold.open = true; }); tell('All parts unfolded.'); }),
      button('Fold all', () => { folds.forEach((fold) => { fold.open = false; }); tell('All parts folded.'); }));
  }
  const stops = all('.exclusion, main > section').filter((stop) => stop.id);
  const go = (step) => {
    const here = stops.findIndex((stop) => stop.getBoundingClientRect().top > 40);
    const at = step > 0 ? (here < 0 ? stops.length - 1 : here) : Math.max(0, (here < 0 ? stops.length : here) - 2);
    const target = stops[at];
    target.tabIndex = -1;
    target.focus({ preventScroll: true });
    target.scrollIntoView();
  };
  const keys = { n: () => go(1), p: () => go(-1), u: () => bar.querySelector('button')?.click(), f: () => { location.hash = '#findings'; }, t: () => { location.hash = '#summary'; } };
  let listening = true;
  document.addEventListener('keydown', (event) => {
    if (!listening || event.ctrlKey || event.metaKey || event.altKey || /^(INPUT|SELECT|TEXTAREA)$/.test(event.target.tagName)) return;
    keys[event.key]?.();
  });
  const toggle = make('input', { type: 'checkbox', checked: true, onchange: () => { listening = toggle.checked; } });
  bar.append(make('label', {}, toggle, ' Keys: n next part, p previous, f findings, t top, u unfold'));
  document.querySelector('nav')?.append(bar);

  // What if: verdicts that the tool itself gave under other levels and bounds.
  const held = document.getElementById('what-if-values');
  const place = document.getElementById('what-if');
  if (held && place) {
    const what = JSON.parse(held.textContent);
    const choice = (label, values, now) => {
      const select = make('select', {}, ...values.map((entry) => make('option', { value: String(entry), textContent: String(entry) + (entry === now ? ' (policy)' : ''), selected: entry === now })));
      return [select, make('label', {}, label + ' ', select)];
    };
    const [level, levelLabel] = choice('Significance level', what.levels, what.level);
    const [bound, boundLabel] = choice('Bound on partial R²', what.bounds, what.bound);
    const result = make('div', { className: 'what-if-result' });
    result.setAttribute('aria-live', 'polite');
    const words = (code) => what.words[code];
    const show = () => {
      const verdicts = what.verdicts[what.levels.indexOf(Number(level.value))][what.bounds.indexOf(Number(bound.value))];
      const now = what.verdicts[what.levels.indexOf(what.level)][what.bounds.indexOf(what.bound)];
      const flips = what.groups.map((group, at) => ({ group, from: now[at], to: verdicts[at] })).filter((entry) => entry.from !== entry.to);
      const same = Number(level.value) === what.level && Number(bound.value) === what.bound;
      result.replaceChildren(make('p', { textContent: same ? 'This is the policy in force: the verdicts are the audit’s own.'
        : flips.length === 0 ? 'No verdict would change.' : flips.length + ' of ' + what.groups.length + ' verdicts would change:' }));
      if (flips.length > 0) {
        result.append(make('ul', {}, ...flips.map((entry) => make('li', {}, make('span', { className: 'name', textContent: entry.group }), ': ' + words(entry.from) + ' → ' + words(entry.to)))));
      }
    };
    level.onchange = show;
    bound.onchange = show;
    place.append(make('div', { className: 'tools' }, levelLabel, boundLabel), result);
    place.hidden = false;
    show();
  }
})();
