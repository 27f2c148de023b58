/* Labels of the pressure ladder: value, name and change of each rung, pushed apart with leaders, order kept. */
import { formatNumber } from '@engine/quantity';
import { escapeText, path, px, text } from './draw';
import { type LadderFrame, type LadderState, type RungKey } from './ladder-scale';

/** Rungs from the top down, with their names. */
export const RUNGS: readonly (readonly [RungKey, string])[] = [
  ['allowed', 'Allowed'],
  ['relieving', 'Relieving'],
  ['mawp', 'MAWP'],
  ['set', 'Set'],
  ['reseating', 'Reseating'],
  ['operating', 'Operating'],
  ['backPressure', 'Back pressure'],
];

const GAP = 17;
const SAME = 0.005;

export type PlacedLabel = { key: RungKey; name: string; value: number; y: number; at: number };

/** Pushes labels apart to 17 px; each stays as near to its rung as the others let it, between the two heights. */
export function spread(labels: PlacedLabel[], from: number, to: number): PlacedLabel[] {
  const sorted = labels.map((label) => ({ ...label, at: label.y })).sort((a, b) => a.y - b.y);
  for (let round = 0; round < 300; round++) {
    let moved = false;
    for (const [i, label] of sorted.entries()) {
      label.at = Math.min(to, Math.max(from, label.at));
      const above = sorted[i - 1];
      if (!above || label.at - above.at >= GAP - 0.01) continue;
      const push = (GAP - (label.at - above.at)) / 2;
      above.at -= push;
      label.at += push;
      moved = true;
    }
    if (!moved) break;
  }
  return sorted;
}

function nameOf(
  key: RungKey,
  state: LadderState,
  long: boolean,
  names: Partial<Record<RungKey, string>>,
): string {
  const plain = names[key] ?? RUNGS.find(([rung]) => rung === key)?.[1] ?? key;
  if (key === 'allowed' && state.allowed !== undefined && state.mawp) {
    const share = `${formatNumber((state.allowed / state.mawp) * 100, 0)} %`;
    return long ? `${plain}, ${share} of MAWP` : `${plain} ${share}`;
  }
  return key === 'backPressure' && long ? `${plain}, total` : plain;
}

function labelsOf(
  state: LadderState,
  frame: LadderFrame,
  long: boolean,
  names: Partial<Record<RungKey, string>>,
) {
  const placed = RUNGS.flatMap(([key]): PlacedLabel[] => {
    const value = state[key];
    if (value === undefined) return [];
    return [{ key, name: nameOf(key, state, long, names), value, y: frame.y(value), at: 0 }];
  });
  return spread(placed, frame.top + 4, frame.bottom);
}

const reach = (key: RungKey) => (key === 'mawp' || key === 'allowed' ? 6 : 0);

function change(now: number, was: number | undefined, decimals: number): string {
  const by = was === undefined ? 0 : now - was;
  if (Math.abs(by) <= SAME) return '';
  return `<tspan class="ld-d" dx="7">${escapeText(by > 0 ? `+${formatNumber(by, decimals)}` : formatNumber(by, decimals))}</tspan>`;
}

export type LabelOptions = { short: boolean; names: Partial<Record<RungKey, string>>; decimals: number };

/** Labels right of the ladder: value, name and (in the wide form) the change against the present state. */
export function rightLabels(
  x: number,
  state: LadderState,
  frame: LadderFrame,
  o: LabelOptions & { before?: LadderState },
): string {
  const start = x + (o.short ? 18 : 26);
  const parts = labelsOf(state, frame, !o.short, o.names).map((label) => {
    const y = px(label.at + 4.5);
    const moved = o.short ? '' : change(label.value, o.before?.[label.key], o.decimals);
    const leader = path(
      'leader',
      `M${x + reach(label.key)} ${label.y}L${x + 10} ${label.y}L${start - 4} ${px(label.at)}`,
    );
    const value = text(`ld-v ${label.key}`, start + 40, y, formatNumber(label.value, o.decimals), 'end');
    return `${leader}${value}<text class="ld-n ${label.key}" x="${start + 47}" y="${y}">${escapeText(label.name)}${moved}</text>`;
  });
  return parts.join('');
}

/** Labels left of the ladder: the present state in second ink; names only in the wide form. */
export function leftLabels(x: number, state: LadderState, frame: LadderFrame, o: LabelOptions): string {
  const parts = labelsOf(state, frame, false, o.names).map((label) => {
    const y = px(label.at + 4.5);
    const leader = path(
      'leader',
      `M${x - reach(label.key)} ${label.y}L${x - 12} ${label.y}L${x - 20} ${px(label.at)}`,
    );
    const value = text(`ld-v was ${label.key}`, x - 24, y, formatNumber(label.value, o.decimals), 'end');
    return leader + value + (o.short ? '' : text(`ld-n was ${label.key}`, x - 74, y, label.name, 'end'));
  });
  return parts.join('');
}
