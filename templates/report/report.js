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
  let quiet;
  const tell = (text) => {
    clearTimeout(quiet);
    say.textContent = '';
    setTimeout(() => { say.textContent = text; }, 30);
    quiet = setTimeout(() => { say.textContent = ''; }, 8000);
  };
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
  // What a cell says in full: the value behind a rounded one, note letters off, a minus that other programs read.
  const words = (cell) => {
    const copy = cell.cloneNode(true);
    all('sup', copy).forEach((note) => note.remove());
    const text = (copy.querySelector('span[title]')?.title ?? copy.textContent).replace(/\s+/g, ' ').trim();
    return /^[−-]?\d+(\.\d+)?(e[-+−]?\d+)?$/.test(text) ? text.replace(/−/g, '-') : text;
  };
  // A range sorts by its lower end.
  const value = (cell) => {
    const text = words(cell);
    const number = Number(text.split(' to ')[0]);
    return text !== '' && Number.isFinite(number) ? number : text.toLowerCase();
  };
  const order = (a, b) => typeof a === typeof b ? (a < b ? -1 : a > b ? 1 : 0) : typeof a === 'number' ? -1 : 1;
  const sortable = (table) => all('thead th', table).forEach((heading, column) => {
    const by = make('button', { type: 'button', className: 'sort', textContent: heading.textContent });
    by.onclick = () => {
      const down = heading.getAttribute('aria-sort') === 'ascending';
      all('thead th', table).forEach((other) => other.removeAttribute('aria-sort'));
      heading.setAttribute('aria-sort', down ? 'descending' : 'ascending');
      const rows = all('tbody tr', table).map((row, at) => ({ row, at, key: value(row.cells[column]), none: row.cells[column].querySelector('.none') !== null }));
      rows.sort((a, b) => a.none - b.none || (down ? order(b.key, a.key) : order(a.key, b.key)) || a.at - b.at);
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
    .map((row) => [...row.cells].map(words).join('\t')).join('\n') + '\n';
  all('.scroll table').forEach((table) => {
    const tools = make('div', { className: 'tools' });
    const name = plain(table.caption);
    if (!table.closest('.sum') && table.tBodies[0].rows.length > 1) sortable(table);
    if (table.tBodies[0].rows.length > 8) filterable(table, tools);
    tools.append(button('Copy table', () => copy(tabbed(table), 'Table'), 'Copy table “' + name + '” as tab-separated text'));
    table.closest('.scroll').before(tools);
  });

  // One exclusion or finding as a paragraph, without the buttons that stand in it.
  const own = (node) => {
    const copy = node.cloneNode(true);
    all('.tools', copy).forEach((tools) => tools.remove());
    return copy.textContent.replace(/\s+/g, ' ').trim();
  };
  const memo = (item) => all('[data-memo]', item).map(own).filter((text) => text !== '').map((text) => /[.?!…]$/.test(text) ? text : text + '.').join(' ');
  all('[data-memo-of]').forEach((item) => {
    const tools = make('div', { className: 'tools' });
    tools.append(button('Copy for a memo', () => copy(memo(item), 'Paragraph'), 'Copy for a memo: “' + item.dataset.memoOf + '” as a paragraph'));
    (item.querySelector('.memo-place') ?? item).append(tools);
  });

  // Folding and jumping.
  const folds = all('main details');
  const bar = make('div', { className: 'tools page-tools' });
  const turn = (open, said) => { folds.forEach((fold) => { fold.open = open; }); tell(said); };
  const unfold = () => turn(true, 'All parts unfolded.');
  if (folds.length > 0) bar.append(button('Unfold all', unfold), button('Fold all', () => turn(false, 'All parts folded.')));
  const to = (target) => {
    target.tabIndex = -1;
    target.focus({ preventScroll: true });
    target.scrollIntoView({ behavior: 'instant' });
  };
  // The part that was jumped to last, while its head is in sight; else the one at the top of the window.
  const here = (stops) => {
    const focused = stops.indexOf(document.activeElement);
    const top = (stop) => stop.getBoundingClientRect().top;
    return focused >= 0 && top(stops[focused]) > -5 && top(stops[focused]) < innerHeight ? focused : Math.max(0, stops.findLastIndex((stop) => top(stop) <= 60));
  };
  const go = (step) => {
    const stops = all('main > header, main > section, section.exclusion').filter((stop) => stop.id && !stop.hidden);
    to(stops[Math.min(stops.length - 1, Math.max(0, here(stops) + step))]);
  };
  const jump = (id) => to(document.getElementById(id));
  const keys = { n: () => go(1), p: () => go(-1), u: unfold, f: () => jump('findings'), t: () => jump('summary') };
  let listening = true;
  document.addEventListener('keydown', (event) => {
    if (!listening || event.ctrlKey || event.metaKey || event.altKey || event.target.matches('input[type="search"], select, textarea')) return;
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
