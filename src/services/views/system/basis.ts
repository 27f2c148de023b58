/* The relief basis read as a document: what is protected, where loads come from, what it rests on. */
import { type Basis, describePath, quantityOf, type Rich } from '@domain/basis';
import { methodById } from '@engine/catalog';
import { formatQuantity } from '@engine/quantity';
import { scenarioLabel } from '@domain/projections';
import { ruleOf } from '@domain/rulebook';
import { originWords, type Shown, shownFigure } from '../shown';
import { type FactGroup, factsOf } from './facts';
import { type OpenedSystem, type Seen } from './open';

export type RatingRow = {
  id: string;
  tag: string;
  what: string;
  mawp: Shown | undefined;
  at: Shown | undefined;
  external: Shown | undefined;
  mdmt: Shown | undefined;
  operating: Shown | undefined;
  code: string;
  origin: string;
};
export type ConditionRow = {
  id: string;
  tag: string;
  kind: string;
  requires: string;
  where: string;
  lock: string;
  round: string;
  supports: string;
};
export type Text = { id: string; label?: string; text: Rich; by?: string };
export type BasisView = {
  boundary: Rich;
  ratings: RatingRow[];
  equipment: FactGroup[];
  sources: FactGroup[];
  fluids: FactGroup[];
  isolations: FactGroup[];
  interlocks: { id: string; tag: string; text: string }[];
  conditions: ConditionRow[];
  once: Text[];
  assumptions: Text[];
  justifications: Text[];
  references: { id: string; title: string; kind: string; names: string }[];
  external: FactGroup[];
  neighbours: { id: string; text: string; href?: string }[];
};

const spaced = (text: string) => text.replaceAll('-', ' ');

const CODES: Record<string, string> = {
  'asme-viii-1': 'ASME VIII-1',
  'asme-viii-2': 'ASME VIII-2',
  'asme-i': 'ASME I',
  'b31.3': 'ASME B31.3',
  en: 'EN',
  'api-620': 'API 620',
  'api-650': 'API 650',
  other: 'other',
};

function ratingsOf(doc: Basis): RatingRow[] {
  return doc.equipment.flatMap((item) =>
    item.sides.flatMap((side) => {
      const external =
        typeof side.external === 'string'
          ? { text: spaced(side.external) }
          : shownFigure(side.external, item.origin);
      const rows = side.ratings.length > 0 ? side.ratings : [undefined];
      return rows.map((rating, index) => ({
        id: index === 0 && side === item.sides[0] ? item.id : `${side.id}-${String(index)}`,
        tag: item.tag,
        what: [item.name ?? spaced(item.kind), item.sides.length > 1 ? side.name : '', HOLDS[side.holds]]
          .filter(Boolean)
          .join(', '),
        mawp: shownFigure(rating?.mawp, item.origin),
        at: shownFigure(rating?.at, item.origin),
        external,
        mdmt: shownFigure(side.mdmt, item.origin),
        operating: shownFigure(side.operating?.normal, item.origin),
        code: [CODES[side.code?.basis ?? ''] ?? '', side.code?.edition].filter(Boolean).join(' '),
        origin: originWords(item.origin) ?? '',
      }));
    }),
  );
}

const HOLDS: Record<string, string> = {
  here: '',
  elsewhere: 'protected by another system',
  pressureless: 'holds no pressure',
};

function conditionsOf(doc: Basis, people: ReadonlyMap<string, string>): ConditionRow[] {
  return doc.fieldConditions.map((one) => {
    const figure = quantityOf(one.requires.figure);
    const supports = doc.scenarios.filter((scenario) =>
      (scenario.dependsOn ?? []).some((item) => item.condition === one.id),
    );
    return {
      id: one.id,
      tag: one.tag,
      kind: one.kind === 'blind' ? 'spade' : spaced(one.kind),
      requires: [one.requires.words, figure && formatQuantity(figure)].filter(Boolean).join(', '),
      where: one.where ?? '',
      lock: one.lock
        ? `${one.lock.number}, key kept by ${people.get(one.lock.keeper) ?? one.lock.keeper}`
        : '',
      round: one.roundMonths === undefined ? '' : `every ${String(one.roundMonths)} months`,
      supports: supports.map((scenario) => scenarioLabel(doc, scenario)).join('; '),
    };
  });
}

const ONCE: Record<Basis['once'][number]['id'], string> = {
  'level-swell': 'Level swell and two-phase relief',
  'simultaneous-loads': 'Loads at the same time',
  depressuring: 'Depressuring',
  'double-jeopardy': 'Two failures at once',
  'bypass-and-spare': 'Bypasses and spares',
};

function textsOf(doc: Basis, people: ReadonlyMap<string, string>) {
  return {
    once: doc.once.map((one) => ({ id: one.id, label: ONCE[one.id], text: one.answer })),
    assumptions: doc.assumptions.map((one) => ({ id: one.id, text: one.text })),
    justifications: doc.justifications.map((one) => ({
      id: one.id,
      label: `${describePath(doc, one.subject).label}: ${ruleOf(one.code)?.condition ?? one.code}`,
      text: one.text,
      by: [people.get(one.by) ?? one.by, one.on].join(', '),
    })),
  };
}

/** The relief basis of an opened system; `people` names those who wrote justifications. */
export function basisView(
  of: OpenedSystem,
  { body: doc }: Seen,
  people: ReadonlyMap<string, string>,
): BasisView {
  const group = (
    list: string,
    id: string,
    name: string,
    note: string | undefined,
    skip: readonly string[],
  ): FactGroup => ({
    id,
    name,
    ...(note === undefined || note === '' ? {} : { note }),
    facts: factsOf(doc, `${list}/${id}`, skip, people),
  });
  return {
    boundary: doc.boundary.text,
    ratings: ratingsOf(doc),
    equipment: doc.equipment.map((one) =>
      group('equipment', one.id, one.tag, one.name ?? spaced(one.kind), ['sides', 'kind']),
    ),
    sources: doc.sources.map((one) =>
      group('sources', one.id, one.tag, one.name ?? spaced(one.kind), ['kind']),
    ),
    fluids: doc.fluids.map((one) => group('fluids', one.id, one.name, one.note, [])),
    isolations: doc.isolations.map((one) =>
      group('isolations', one.id, one.tag ?? `${one.where} ${spaced(one.kind)} valve`, one.note, []),
    ),
    interlocks: doc.interlocks.map((one) => ({ id: one.id, tag: one.tag, text: one.text })),
    conditions: conditionsOf(doc, people),
    ...textsOf(doc, people),
    references: doc.references.map((one) => ({
      id: one.id,
      title: one.title,
      kind: spaced(one.kind),
      names: one.names.join(', '),
    })),
    external: doc.externalSheets.map((one) =>
      group(
        'externalSheets',
        one.id,
        one.title,
        `${one.author}${one.on ? `, ${one.on}` : ''}: ${methodById(one.method)?.title ?? one.method}`,
        ['title', 'author', 'method', 'madeOf', 'on'],
      ),
    ),
    neighbours: doc.neighbours.map((one) => {
      const found = of.tags.get(one.with);
      const href = found?.kind === 'system' ? `/s/${of.actor.site.slug}/systems/${found.tag}` : undefined;
      return { id: one.id, text: `${found?.tag ?? one.with}: ${one.what}`, ...(href ? { href } : {}) };
    }),
  };
}
