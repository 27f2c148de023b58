/* Method f.inflow-balance: what comes in at relieving pressure less what surely leaves. */
import { type Method } from '../../catalog/types';
import { type SheetBuilder, workSheet } from '../../sheet';
import { input, optional, output } from '../common/describe';
import { countNumbered, numbered } from '../common/numbered';
import { SYSTEM_UNITS, systemOf } from '../common/system';

/** What is left to relieve: Σ in − Σ out, never negative. One unit. */
export function surplus(inflows: readonly number[], outflows: readonly number[]): number {
  const sum = (list: readonly number[]) => list.reduce((total, one) => total + one, 0);
  return Math.max(0, sum(inflows) - sum(outflows));
}

function readFlows(sheet: SheetBuilder, name: string, unit: string, tex: string): number[] {
  return Array.from({ length: countNumbered(sheet, name) }, (_, i) =>
    sheet.number(numbered(name, i + 1), unit, { min: 0 }, `${tex.slice(0, -1)},${i + 1}}`),
  );
}

/** f.inflow-balance: mass balance of a system whose outlet, absorbent or heat is lost. */
export const INFLOW_BALANCE: Method = {
  id: 'f.inflow-balance',
  version: 1,
  topic: 'f.inflow-balance',
  title: 'Inflow at relieving pressure less outflow that surely goes on',
  editions: ['API 521, 5th to 7th edition (approach)'],
  source:
    'API Standard 521: load as the inflows at relieving pressure less the outflows through paths that keep their position (approach from memory); mass balance',
  validity:
    'All flows at relieving pressure; no credit for an outlet that must act, nor for the one that failed; gas and liquid are balanced on sheets of their own.',
  inputs: [
    input('W_in', 'flow in at relieving pressure (W_in_2, W_in_3 … further ones)', 'mass-flow', {
      rangeKey: 'reliefLoad',
      each: 'stream',
    }),
    optional('W_out', 'flow out through a path that stays open (W_out_2, … further ones)', 'mass-flow', {
      each: 'stream',
    }),
  ],
  outputs: [output('relief_load', 'relief load', 'mass-flow')],
  work(inputs, edition) {
    return workSheet(this, inputs, edition, (sheet) => {
      const unit = SYSTEM_UNITS[systemOf(inputs, ['W_in'])].W;
      const inflows = readFlows(sheet, 'W_in', unit, 'W_{in}');
      if (inflows.length === 0) sheet.quantity('W_in');
      const outflows = readFlows(sheet, 'W_out', unit, 'W_{out}');
      const names = (name: string, list: readonly number[]) => list.map((_, i) => numbered(name, i + 1));
      const W = sheet.step(
        { key: 'W', meaning: 'flow to be relieved', value: surplus(inflows, outflows), unit },
        (v) => {
          const out = names('W_out', outflows).map(v).join(' - ');
          return `\\max(0,\\ ${names('W_in', inflows).map(v).join(' + ')}${out === '' ? '' : ` - ${out}`})`;
        },
      );
      if (W === 0) sheet.warn('NO_LOAD', 'As much leaves as comes in: nothing is left to relieve.');
      sheet.output('relief_load', W, unit);
    });
  },
};
