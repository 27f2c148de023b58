/* Marks that stand beside words: verdicts and the valves of the gate rail. */
import { path, px } from './draw';

export type VerdictWord = 'adequate' | 'marginal' | 'inadequate' | 'not-sized';
export type GateState = 'passed' | 'waiting' | 'shut' | 'held';

export const VERDICT_WORDS: Record<VerdictWord, string> = {
  adequate: 'Adequate',
  marginal: 'Marginal',
  inadequate: 'Inadequate',
  'not-sized': 'Not sized',
};

const SEAT = '<rect x="14" y="1" width="2" height="12"/>';
const VERDICT_SHAPES: Record<VerdictWord, string> = {
  adequate: `<rect x="1" y="5" width="9" height="4"/>${SEAT}`,
  marginal: `<rect x="1" y="5" width="13" height="4"/>${SEAT}`,
  inadequate: `<rect x="1" y="5" width="13" height="4"/>${SEAT}<path d="M16 2h5v10h-5z"/>`,
  'not-sized': `<rect x="1" y="6" width="2" height="2"/><rect x="5" y="6" width="2" height="2"/><rect x="9" y="6" width="2" height="2"/>${SEAT}`,
};

/** The orifice bar reduced to 22 × 14: required area is the bar, installed area the seat line. */
export function verdictMark(verdict: VerdictWord): string {
  return `<svg class="vmark" viewBox="0 0 22 14" width="22" height="14" aria-hidden="true">${VERDICT_SHAPES[verdict]}</svg>`;
}

const VALVE = 'M6 20 22 28 6 36ZM38 20 22 28 38 36Z';

/** A valve on the pipe line at y = 28: stem up when passed, down when waiting or shut, two bars when on hold. */
export function valve(state: GateState): string {
  const top = state === 'passed' ? 6 : 16;
  const shape =
    state === 'held'
      ? path('body', 'M20 16V40M24 16V40')
      : path('body', VALVE) + path('stem', `M22 27V${top}`) + path('wheel', `M13 ${top}H31`);
  return `<svg class="valve ${state}" viewBox="0 0 44 40" width="44" height="40" aria-hidden="true">${shape}</svg>`;
}

function pipe(index: number, at: number, gates: number, from: number, to: number): string {
  if (index < at || at >= gates) return path('full', `M${from} 8H${to}`);
  if (index === at) return path('here', `M${from} 8H${to}`);
  return path('empty', `M${from} 6.5H${to}M${from} 9.5H${to}`);
}

/**
 * The rail in one table cell, 118 × 16 for five gates.
 * @param at index of the waiting gate from 0; `gates` when all are passed.
 */
export function miniRail(at: number, options: { held?: boolean; gates?: number } = {}): string {
  const gates = options.gates ?? 5;
  const width = gates * 22 + 8;
  let drawn = '';
  for (let i = 0; i <= gates; i++) {
    const from = i === 0 ? 1 : 14 + (i - 1) * 22 + 5;
    drawn += pipe(i, at, gates, from, i === gates ? width - 1 : 14 + i * 22 - 5);
  }
  for (let i = 0; i < gates; i++) {
    const x = 14 + i * 22;
    const kind = i < at ? 'v-passed' : i === at ? 'v-waiting' : 'v-shut';
    drawn += path(kind, `M${x - 5} 3.5L${x} 8L${x - 5} 12.5ZM${x + 5} 3.5L${x} 8L${x + 5} 12.5Z`);
  }
  if (options.held) {
    const x = px(Math.max(5, 14 + (at - 1) * 22 + 11));
    drawn += path('v-held', `M${x - 1.5} 1V15M${x + 1.5} 1V15`);
  }
  return `<svg class="mini" viewBox="0 0 ${width} 16" width="${width}" height="16" aria-hidden="true">${drawn}</svg>`;
}
