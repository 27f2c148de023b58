/* Live figures in the texts of a case: numbers that the writer affirmed become nodes that follow the sheets. */
import { type Rich } from '@domain/basis';
import { type Evaluation } from '@domain/evaluate';
import { type Q, unitLabel } from '@engine/quantity';
import { answerId, documentId, scenarioKey } from '../convert';
import { type DemoLive } from './demo-case-types';

/** Evaluations of a document on both sides of the case. */
export type Sides = { base: Evaluation; this: Evaluation };

const OUTPUTS: Record<string, (sheet: string) => string> = {
  relief_load: (sheet) => `sheets/load:${sheet}#relief_load`,
  required_area: (sheet) => `sheets/size:${sheet}#A_required`,
  'detail.air_equivalent': (sheet) => `sheets/load:${sheet}#air_equivalent`,
};
type Found = { at: number; text: string; node: unknown; unit: string };

function isQ(value: Q | string | undefined): value is Q {
  return typeof value === 'object';
}

function nodeOf(
  live: DemoLive,
  sides: ReadonlyMap<string, Sides>,
): { node: unknown; unit: string } | undefined {
  const [tag = '', cause = '', group = ''] = live.sheet.split('/');
  const path = OUTPUTS[live.key]?.(`${scenarioKey(cause)}/${answerId(group)}`);
  const side = live.state === 'before' ? 'base' : 'this';
  const affirmed = path === undefined ? undefined : sides.get(tag)?.[side].figures[path];
  if (path === undefined || !isQ(affirmed)) return undefined;
  const attrs = {
    doc: documentId(tag),
    side,
    path,
    decimals: live.decimals,
    affirmed: { value: affirmed.value, unit: affirmed.unit },
  };
  return { node: { type: 'figure', attrs }, unit: affirmed.unit };
}

function findAll(text: string, lives: readonly DemoLive[], sides: ReadonlyMap<string, Sides>): Found[] {
  const found: Found[] = [];
  for (const live of lives) {
    const made = nodeOf(live, sides);
    const pattern = new RegExp(`(?<![\\d.,])${live.text.replaceAll('.', '\\.')}(?![\\d,]|\\.\\d)`);
    const at = made ? (pattern.exec(text)?.index ?? -1) : -1;
    if (made && at >= 0 && !found.some((other) => other.at === at))
      found.push({ at, text: live.text, ...made });
  }
  return found.sort((a, b) => a.at - b.at);
}

/** The unit after a number is shown by the node itself. */
function restAfter(text: string, found: Found): string {
  const rest = text.slice(found.at + found.text.length);
  const said = [found.unit, unitLabel(found.unit)].find((unit) => rest.startsWith(` ${unit}`));
  return said === undefined ? rest : rest.slice(said.length + 1);
}

/** A text of one paragraph in which the figures that the case lists are live. */
export function richWithFigures(
  text: string,
  lives: readonly DemoLive[],
  sides: ReadonlyMap<string, Sides>,
): Rich {
  const content: unknown[] = [];
  const all = findAll(text, lives, sides);
  let rest = text;
  for (const found of all) {
    const before = rest.slice(0, rest.length - (text.length - found.at));
    if (before !== '') content.push({ type: 'text', text: before });
    content.push(found.node);
    rest = restAfter(text, found);
  }
  if (rest !== '') content.push({ type: 'text', text: rest });
  return { type: 'doc', content: [{ type: 'paragraph', content }] };
}
