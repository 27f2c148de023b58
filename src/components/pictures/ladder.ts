/* Pressure ladder: one vertical scale for a relief point, present beside proposed; what does not change runs straight through, what changes steps. */
import { formatNumber } from '@engine/quantity';
import { escapeText, path, px, text } from './draw';
import { leftLabels, rightLabels, RUNGS } from './ladder-labels';
import { ladderFrame, ladderScale, type LadderFrame, type LadderState, type RungKey } from './ladder-scale';

export type Ladder = {
  /** The relief point's tag. */
  of: string;
  /** Unit of all pressures as readers know it: "barg". */
  unit: string;
  /** At least one of the two; with both the ladder shows the change. */
  present?: LadderState;
  proposed?: LadderState;
  /** Second line over each state: "rev 6, L". */
  captions?: { present?: string; proposed?: string };
  /** wide: labels on both sides or dimension lines; short: for asides, phones and print. */
  form: 'wide' | 'short';
  /** Unique on the page. */
  id: string;
  width?: number;
  height?: number;
  /** Other names of rungs (the site's terms). */
  names?: Partial<Record<RungKey, string>>;
};

type Column = { state: LadderState; a: number; b: number; role: 'was' | 'now' };
const CHANGING: readonly RungKey[] = ['operating', 'reseating', 'relieving', 'backPressure', 'set'];

function rung(key: RungKey, value: number | undefined, column: Column, frame: LadderFrame): string {
  if (value === undefined) return '';
  const y = frame.y(value);
  const caps = key === 'set' ? `M${column.a} ${px(y - 5)}v10M${column.b} ${px(y - 5)}v10` : '';
  return path(`rung ${key}`, `M${column.a} ${y}H${column.b}${caps}`);
}

function rect(name: string, column: Column, from: number, to: number, fill = ''): string {
  if (to - from <= 0) return '';
  return `<rect class="${name}" x="${column.a}" y="${px(from)}" width="${column.b - column.a}" height="${px(to - from)}"${fill}/>`;
}

function ticks(column: Column, frame: LadderFrame): string {
  const marks: number[] = [];
  for (let p = frame.lo; p <= frame.hi + frame.step / 100; p += frame.step) marks.push(p);
  for (let p = 0; frame.gap > 0 && p < frame.low - frame.step / 2; p += frame.step) marks.push(p);
  return path(
    'ld-tick',
    marks.map((p) => `M${column.a} ${frame.y(p)}h4M${column.b} ${frame.y(p)}h-4`).join(''),
  );
}

function stile(x: number, frame: LadderFrame): string {
  const broken = frame.gap > 0 ? `V${px(frame.breakAt + 4)}l-5 3.5l10 7l-5 3.5` : '';
  return path('stile', `M${x} ${frame.top}${broken}V${frame.bottom}`);
}

function grounds(column: Column, frame: LadderFrame, id: string): string {
  const { set, relieving, operating, backPressure } = column.state;
  const { y, breakAt, gap, bottom } = frame;
  let drawn = relieving === undefined ? '' : rect('ld-over', column, y(relieving), y(set));
  if (operating !== undefined && gap > 0) {
    drawn += rect('ld-op', column, y(operating), breakAt) + rect('ld-op', column, breakAt + gap, bottom);
  } else if (operating !== undefined) drawn += rect('ld-op', column, y(operating), y(0));
  if (backPressure !== undefined)
    drawn += rect('ld-back', column, y(backPressure), y(0), ` fill="url(#${id}-back)"`);
  return drawn;
}

function drawColumn(column: Column, frame: LadderFrame, id: string): string {
  const rungs = CHANGING.map((key) => rung(key, column.state[key], column, frame)).join('');
  const body =
    grounds(column, frame, id) + stile(column.a, frame) + stile(column.b, frame) + ticks(column, frame);
  return `<g class="${column.role}">${body}${rungs}</g>`;
}

function limits(columns: Column[], frame: LadderFrame, id: string): string {
  const first = columns[0];
  const last = columns.at(-1);
  if (!first || !last) return '';
  const through = { ...last, a: first.a };
  const straight = (key: RungKey) => first.state[key] === last.state[key];
  const spans = (key: RungKey) => (straight(key) ? [through] : columns);
  const hatches = spans('allowed').map(({ state, a, b, role }) =>
    state.allowed === undefined
      ? ''
      : rect(
          'ld-above',
          { state, a, b, role },
          frame.top,
          frame.y(state.allowed),
          ` fill="url(#${id}-above)"`,
        ),
  );
  const rungs = (['mawp', 'allowed'] as const).flatMap((key) =>
    spans(key).map((column) => {
      const line = rung(key, column.state[key], { ...column, a: column.a - 6, b: column.b + 6 }, frame);
      return column.role === 'was' ? `<g class="was">${line}</g>` : line;
    }),
  );
  return hatches.join('') + rungs.join('');
}

function rises(columns: Column[], frame: LadderFrame): string {
  const [was, now] = columns;
  if (!was || !now) return '';
  const lines = [...CHANGING, 'mawp', 'allowed'] as RungKey[];
  return lines
    .map((key) => {
      const from = was.state[key];
      const to = now.state[key];
      const limit = key === 'mawp' || key === 'allowed';
      if (from === undefined || to === undefined || (limit && from === to)) return '';
      const reach = limit ? 6 : 0;
      return path(`rise ${key}`, `M${was.b + reach} ${frame.y(from)}L${now.a - reach} ${frame.y(to)}`);
    })
    .join('');
}

function dimension(from: number, to: number, x: number, frame: LadderFrame, words: string): string {
  const [y0, y1] = [frame.y(from), frame.y(to)];
  const line = `M${x - 5} ${y0}H${x + 13}M${x - 5} ${y1}H${x + 13}M${x} ${y0}V${y1}M${x - 3} ${px(y0 + 3)}l6 -6M${x - 3} ${px(y1 + 3)}l6 -6`;
  return path('dim', line) + text('ld-dim', x - 8, (y0 + y1) / 2 + 4, words, 'end');
}

function dimensions(column: Column, frame: LadderFrame, decimals: number): string {
  const { mawp, allowed, operating, set } = column.state;
  let drawn = '';
  if (mawp !== undefined && allowed !== undefined) {
    drawn += dimension(
      mawp,
      allowed,
      column.a - 16,
      frame,
      `accumulation ${formatNumber(allowed - mawp, decimals)}`,
    );
  }
  if (operating !== undefined && operating < set) {
    drawn += dimension(
      operating,
      set,
      column.a - 16,
      frame,
      `margin ${formatNumber((1 - operating / set) * 100, 1)} % of set`,
    );
  }
  return drawn;
}

function patterns(id: string): string {
  const pattern = (name: string, size: number, turn: number, hatch: string) =>
    `<pattern id="${id}-${name}" width="${size}" height="${size}" patternUnits="userSpaceOnUse" patternTransform="rotate(${turn})"><path class="${hatch}" d="M0 0V${size}"/></pattern>`;
  return `<defs>${pattern('above', 6, 45, 'hatch')}${pattern('back', 4, -45, 'hatch2')}</defs>`;
}

/** The ladder in one sentence, for those who do not see it. */
export function ladderSentence(ladder: Ladder): string {
  const { present, proposed, unit, of } = ladder;
  const state = proposed ?? present;
  if (!state) return `Pressure ladder of ${of}`;
  const { decimals } = ladderScale([present, proposed].filter((s): s is LadderState => s !== undefined));
  const said = RUNGS.flatMap(([key, name]) => {
    const now = state[key];
    if (now === undefined) return [];
    const was = proposed ? present?.[key] : undefined;
    const from = was === undefined || was === now ? '' : `${formatNumber(was, decimals)} to `;
    return [
      `${(ladder.names?.[key] ?? name).replace(/^[A-Z](?![A-Z])/, (c) => c.toLowerCase())} ${from}${formatNumber(now, decimals)}`,
    ];
  });
  return `Pressure ladder of ${of} in ${unit}: ${said.join(', ')}`;
}

function columnsOf(ladder: Ladder, width: number): Column[] {
  const { present, proposed } = ladder;
  const short = ladder.form === 'short';
  const wide = short ? 44 : 64;
  if (present && proposed) {
    const between = short ? 30 : 56;
    const x = Math.round((short ? 44 : (width - (2 * wide + between)) / 2 - 36) + 18);
    const second = x + wide + between;
    return [
      { state: present, a: x, b: x + wide, role: 'was' },
      { state: proposed, a: second, b: second + wide, role: 'now' },
    ];
  }
  const state = proposed ?? present;
  const x = (short ? 0 : 132) + 18;
  return state ? [{ state, a: x, b: x + wide, role: 'now' }] : [];
}

function heads(ladder: Ladder, columns: Column[]): string {
  const two = columns.length === 2;
  const captions = ladder.captions ?? {};
  return columns
    .map(({ a, b, role }) => {
      const x = (a + b) / 2;
      const words = two ? (role === 'was' ? 'Present' : 'Proposed') : ladder.of;
      const caption =
        role === 'was' ? captions.present : (captions.proposed ?? (two ? undefined : captions.present));
      const second = caption && ladder.form === 'wide' ? text('ld-s', x, 27, caption, 'middle') : '';
      return text(`ld-h${role === 'was' ? ' was' : ''}`, x, second ? 14 : 20, words, 'middle') + second;
    })
    .join('');
}

/** Draws the ladder as an SVG element; colours come from the style sheet, so dark and print follow. */
export function pressureLadder(ladder: Ladder): string {
  const { form, unit, names = {} } = ladder;
  const short = form === 'short';
  const width = ladder.width ?? (short ? 320 : ladder.present && ladder.proposed ? 620 : 470);
  const height = ladder.height ?? (short ? 430 : 460);
  const columns = columnsOf(ladder, width);
  const first = columns[0];
  const last = columns.at(-1);
  if (!first || !last) return '';
  const scale = ladderScale(columns.map(({ state }) => state));
  const frame = ladderFrame(scale, 34, height - 26);
  const options = { short, names, decimals: scale.decimals };
  const two = first !== last;
  const broken = frame.gap > 0 ? ` · broken ${formatNumber(scale.low)}–${formatNumber(scale.lo)}` : '';
  const foot = `${unit} · tick ${formatNumber(scale.step)}${broken}`;
  const drawn = [
    patterns(ladder.id),
    limits(columns, frame, ladder.id),
    ...columns.map((column) => drawColumn(column, frame, ladder.id)),
    rises(columns, frame),
    rightLabels(last.b, last.state, frame, { ...options, before: two ? first.state : undefined }),
    two
      ? leftLabels(first.a, first.state, frame, options)
      : short
        ? ''
        : dimensions(first, frame, scale.decimals),
    heads(ladder, columns),
    path('ld-base', `M${first.a - 6} ${frame.bottom}H${last.b + 6}`),
    text('ld-s', Math.max((first.a + last.b) / 2, short ? 64 : 0), frame.bottom + 16, foot, 'middle'),
  ];
  return `<svg class="ladder" viewBox="0 0 ${width} ${height}" width="${width}" height="${height}" role="img" aria-label="${escapeText(ladderSentence(ladder))}">${drawn.join('')}</svg>`;
}
