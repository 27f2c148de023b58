/* The relief points of a system: what they are, what they are set to, their pressure ladders, and what they come to. */
import { type Basis, quantityOf, type ReliefPoint } from '@domain/basis';
import { kindOf, pointFacts, type RungKind } from '@domain/projections';
import { type Evaluation, type Verdict } from '@domain/evaluate';
import { convert, type Q, QuantityError, toSI, unitLabel } from '@engine/quantity';
import { inline, percent, type Shown, shownFigure, shownQ, shownShare } from '../shown';
import { type FactGroup, factsOf } from './facts';
import { type OpenedSystem, type Seen } from './open';
import { sheetHref } from './scenario-lines';

/** Pressures of a ladder, all in one unit. */
export type LadderView = {
  unit: string;
  state: {
    set: number;
    operating?: number;
    reseating?: number;
    relieving?: number;
    backPressure?: number;
    mawp?: number;
    allowed?: number;
  };
};
export type PointView = {
  id: string;
  tag: string;
  kind: string;
  service: string;
  verdict?: Verdict;
  ladder?: LadderView;
  hidden: boolean;
  /** What the sheets of the relief point come to. */
  results: { label: string; text: string; href: string }[];
  facts: FactGroup;
};
/** One property across the relief points; brass where it is the set pressure. */
export type PointRow = { label: string; cells: string[]; unit: string; set: boolean };
export type PointsView = { points: PointView[]; rows: PointRow[]; interlocks: string[] };

const RUNGS: Record<Exclude<RungKind, 'operating-max' | 'burst'>, keyof LadderView['state']> = {
  operating: 'operating',
  reseating: 'reseating',
  set: 'set',
  mawp: 'mawp',
  maap: 'allowed',
  relieving: 'relieving',
  'back-pressure': 'backPressure',
};

/** Of a valve that opens both ways, the side of the vacuum has no place on the ladder of its set pressure. */
const ABOVE_SET: ReadonlySet<RungKind> = new Set(['relieving', 'maap']);

/** The ladder of a relief point in the unit of its set pressure; none for vacuum and for what has no set pressure. */
export function ladderOf(
  of: OpenedSystem,
  doc: Basis,
  evaluation: Evaluation,
  id: string,
): LadderView | undefined {
  const rungs = pointFacts(doc, evaluation, id)?.rungs ?? [];
  const set = rungs.find((rung) => rung.kind === 'set') ?? rungs.find((rung) => rung.kind === 'burst');
  if (!set) return undefined;
  const { unit } = set.shown;
  const inUnit = (q: Q): number | undefined => {
    try {
      return convert(q, unit, { barometer: of.actor.site.barometer });
    } catch (error) {
      if (error instanceof QuantityError) return undefined;
      throw error;
    }
  };
  const known = rungs.flatMap(({ kind, shown }) => {
    const key = kind === 'operating-max' || kind === 'burst' ? undefined : RUNGS[kind];
    const value = key && inUnit(shown);
    if (value === undefined || (ABOVE_SET.has(kind) && set.shown.value > 0 && value < 0)) return [];
    return key ? [[key, value] as const] : [];
  });
  return { unit: unitLabel(unit), state: { ...Object.fromEntries(known), set: set.shown.value } };
}

function resultsOf(of: OpenedSystem, seen: Seen, point: ReliefPoint): PointView['results'] {
  const found = seen.evaluation?.points[point.id];
  const set = quantityOf(point.set);
  const share = (q: Q): string =>
    set ? `${inline(shownQ(q))}, ${percent(toSI(q) / toSI(set))}\u00a0% of set` : inline(shownQ(q));
  const each: [string, Q | undefined, string, boolean][] = [
    ['Rated capacity', found?.rated, `rated:${point.id}`, false],
    ['Inlet pressure loss', found?.inletLoss, `inlet:${point.id}`, true],
    ['Built-up back pressure', found?.builtUp, `outlet:${point.id}/own`, true],
    ['Total back pressure', found?.total, `outlet:${point.id}/own`, false],
  ];
  return each.flatMap(([label, q, key, ofSet]) =>
    q ? [{ label, text: ofSet ? share(q) : inline(shownQ(q)), href: sheetHref(of, key) }] : [],
  );
}

const SERVICE: Record<ReliefPoint['service'], string> = {
  'in-service': 'in service',
  spare: 'spare',
  'out-of-service': 'out of service',
};

function pointView(of: OpenedSystem, seen: Seen, point: ReliefPoint): PointView {
  const { body, evaluation } = seen;
  const ladder = evaluation && ladderOf(of, body, evaluation, point.id);
  const verdict = evaluation?.points[point.id]?.verdict;
  return {
    id: point.id,
    tag: point.tag,
    kind: kindOf(body, point),
    service: SERVICE[point.service],
    hidden: of.hidden,
    results: resultsOf(of, seen, point),
    facts: {
      id: point.id,
      name: point.tag,
      facts: factsOf(body, `reliefPoints/${point.id}`, ['axes', 'service']),
    },
    ...(ladder ? { ladder } : {}),
    ...(verdict ? { verdict } : {}),
  };
}

type Property = { label: string; of: (point: ReliefPoint) => Shown | undefined; set?: boolean };
const word = (text: string | undefined): Shown | undefined => (text === undefined ? undefined : { text });

const PROPERTIES: readonly Property[] = [
  {
    label: 'Size',
    of: (one) =>
      word([one.inlet?.nominal, one.orifice.letter, one.outlet?.nominal].filter(Boolean).join(' ')),
  },
  { label: 'Effective area', of: (one) => shownFigure(one.orifice.effective) },
  { label: 'Actual area', of: (one) => shownFigure(one.orifice.actual) },
  { label: 'Coefficient of discharge, gas', of: (one) => shownFigure(one.k?.gas) },
  { label: 'Coefficient of discharge, liquid', of: (one) => shownFigure(one.k?.liquid) },
  { label: 'Set pressure', of: (one) => shownFigure(one.set), set: true },
  { label: 'Set vacuum', of: (one) => shownFigure(one.setVacuum), set: true },
  { label: 'Burst pressure', of: (one) => shownFigure(one.disk?.burst), set: true },
  { label: 'Cold differential test pressure', of: (one) => shownFigure(one.cdtp) },
  { label: 'Overpressure', of: (one) => shownShare(one.overpressure) },
  { label: 'Blowdown', of: (one) => shownShare(one.blowdown) },
  {
    label: 'Bonnet',
    of: (one) => word(one.bonnet && [one.bonnet.kind, one.bonnet.ventTo].filter(Boolean).join(', ')),
  },
  { label: 'Maker and model', of: (one) => word([one.maker, one.model].filter(Boolean).join(' ')) },
  { label: 'Test interval', of: (one) => shownFigure(one.test?.interval) },
];

function rowOf(property: Property, points: readonly ReliefPoint[]): PointRow[] {
  const shown = points.map((point) => property.of(point));
  if (shown.every((one) => one === undefined || one.text === '')) return [];
  const units = new Set(shown.flatMap((one) => one?.unit ?? []));
  const unit = units.size === 1 ? ([...units][0] ?? '') : '';
  const cells = shown.map((one) => (one ? (unit === '' ? inline(one) : one.text) : '–'));
  return [{ label: property.label, cells, unit, set: property.set ?? false }];
}

/** The relief points of an opened system. */
export function pointsOf(of: OpenedSystem, seen: Seen): PointsView {
  const { body } = seen;
  const kind: PointRow = {
    label: 'Kind',
    cells: body.reliefPoints.map((point) => kindOf(body, point)),
    unit: '',
    set: false,
  };
  const service = {
    ...kind,
    label: 'Service',
    cells: body.reliefPoints.map((point) => SERVICE[point.service]),
  };
  const discharge = {
    ...kind,
    label: 'Discharges to',
    cells: body.reliefPoints.map((point) => dischargeOf(of, body, point)),
  };
  return {
    points: body.reliefPoints.map((point) => pointView(of, seen, point)),
    rows: [kind, service, ...PROPERTIES.flatMap((one) => rowOf(one, body.reliefPoints)), discharge],
    interlocks: body.interlocks.map((one) =>
      one.text.startsWith(one.tag) ? one.text : `${one.tag}: ${one.text}`,
    ),
  };
}

/** Where a relief point discharges, in words. */
export function dischargeOf(of: OpenedSystem, doc: Basis, point: ReliefPoint): string {
  const end = doc.lines.find((line) => line.point === point.id && line.side === 'outlet')?.end;
  if (!end) return '–';
  if (end.to === 'header') return `header ${of.tags.get(end.header ?? '')?.tag ?? ''}`.trim();
  return [end.to.replaceAll('-', ' '), end.location ?? end.equipment].filter(Boolean).join(', ');
}
