/* References, field conditions, justifications, neighbours and what is asked once a system. */
import { type Basis, type FieldCondition, hashOf, type Justification, type Reference } from '@domain/basis';
import scenarios from '../data/supplement/scenarios.json';
import site from '../data/supplement/site.json';
import { type DemoQ, type DemoSystem } from './demo-types';
import { compact, maybeFigure, rich } from './figures';
import { documentId, idOf, personId, uniqueIds } from './ids';
import { ONCE_CAUSES } from './keys';
import { pointId } from './points';

type Condition = {
  tag: string;
  kind: string;
  requires: { words: string; figure?: DemoQ };
  where: string;
  roundMonths: number;
  lock?: { number: string; keeper: string };
};
const CONDITIONS: Record<string, Condition[] | undefined> = scenarios.conditions as never;

const KINDS: [RegExp, Reference['kind']][] = [
  [/^\d{3}-P-/, 'pid'],
  [/^(\d{3}-|ISO-|\d{3}-L-)/, 'drawing'],
  [/^(DS-|Vent certificates|KD-|Rental|IC-)/, 'data-sheet'],
  [/^(SIM-|HM-|HDR-)/, 'simulation'],
  [/^(RS-|CS-|CN-|SU-|PU-)/, 'calculation'],
  [/^CAL-/, 'calorimetry'],
  [/^Standing order/, 'procedure'],
  [/^(Import contract|Heat-transfer)/, 'other'],
];
const TAGS = /\b[A-Z]{1,4}-\d{3}[A-Z]?\b/g;

/** References with a kind guessed from their number, and the tags that they name. */
export function referencesOf(system: DemoSystem): Reference[] {
  return system.references.map((title, n) => ({
    id: `ref_${String(n + 1)}`,
    title,
    names: [...new Set(title.match(TAGS) ?? [])].filter((tag) =>
      system.equipment.some((item) => item.tag === tag),
    ),
    kind: KINDS.find(([pattern]) => pattern.test(title))?.[1] ?? 'other',
  }));
}

/** Field conditions of a system from the supplement. */
export function conditionsOf(system: DemoSystem): FieldCondition[] {
  return (CONDITIONS[system.id] ?? []).map((condition) =>
    compact({
      id: idOf('fc', condition.tag),
      tag: condition.tag,
      requires: compact({ words: condition.requires.words, figure: maybeFigure(condition.requires.figure) }),
      lock: condition.lock,
      where: condition.where,
      photo: true,
      roundMonths: condition.roundMonths,
      kind: condition.kind as FieldCondition['kind'],
    }),
  );
}

type Written = { code: string; subject: string; by: string; acceptedBy: string; on: string; text: string };
const WRITTEN: Record<string, Written[] | undefined> = scenarios.justifications;

/** Justifications of the supplement, on scenarios. */
function writtenFor(system: DemoSystem): Justification[] {
  return (WRITTEN[system.id] ?? []).map((own) => ({
    id: idOf('js', own.code, own.subject.split('/')[1] ?? ''),
    code: own.code,
    subject: own.subject,
    values: {},
    hash: hashOf('outcome', { code: own.code, subject: own.subject }),
    text: rich(own.text),
    by: personId(own.by),
    on: own.on,
    acceptedBy: personId(own.acceptedBy),
  }));
}

/** Justifications, one a device; their outcome's values and hash are bound once the rulebook has judged the document. */
export function justificationsOf(system: DemoSystem): Justification[] {
  const devices = (system.justifications ?? []).flatMap((own) =>
    own.devices.map((tag) => ({
      id: idOf('js', tag, 'inlet-loss'),
      code: 'inlet-loss-high',
      subject: `reliefPoints/${pointId(tag)}`,
      values: {},
      hash: hashOf('outcome', { code: 'inlet-loss-high', tag }),
      text: rich(own.text),
      by: personId(own.by),
      on: own.date,
      acceptedBy: personId(own.accepted_by),
    })),
  );
  return [...devices, ...writtenFor(system)];
}

/** Systems that share something with this one. */
export function neighboursOf(system: DemoSystem): Basis['neighbours'] {
  const unique = uniqueIds();
  return system.shares.map((share) => ({
    id: unique(idOf('nb', share.with)),
    with: documentId(share.with),
    what: share.what,
  }));
}

/** The five questions that are asked once a system. */
export function onceOf(system: DemoSystem): Basis['once'] {
  const own = Object.entries(ONCE_CAUSES).flatMap(([cause, id]) => {
    const reason = system.causes.find((candidate) => candidate.cause === cause)?.reason;
    return reason === undefined ? [] : [{ id, answer: rich(reason) }];
  });
  const others = (['depressuring', 'double-jeopardy', 'bypass-and-spare'] as const).map((id) => ({
    id,
    answer: rich((site.once[id] ?? '').replace('{tag}', system.id)),
  }));
  return [...own, ...others];
}
