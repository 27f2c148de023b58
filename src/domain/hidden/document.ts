/* A relief basis without its results: stated loads, external figures, chosen orifices, readings of the unseen check, prose. */
import { type Basis, type Path } from '@domain/basis';
import { HIDDEN_WORD, maskProse, maskRich } from './prose';

type Node = Record<string, unknown>;
const isNode = (value: unknown): value is Node =>
  typeof value === 'object' && value !== null && !Array.isArray(value);
const isFigure = (value: unknown): value is Node => isNode(value) && 'unit' in value && 'value' in value;
const isRich = (value: unknown): boolean =>
  isNode(value) && value['type'] === 'doc' && Array.isArray(value['content']);

/** A figure whose value is withheld; its origin stays, so that one knows where to read it. It reads as not known. */
function withheldFigure(figure: Node): Node {
  const origin = isNode(figure['origin']) ? { origin: maskOrigin(figure['origin']) } : {};
  return { unknown: HIDDEN_WORD, hidden: true, ...origin };
}

function maskOrigin(origin: Node): Node {
  const { figure: _figure, ...rest } = origin;
  return Object.fromEntries(
    Object.entries(rest).map(([key, value]) => [
      key,
      typeof value === 'string' && key === 'ref' ? maskProse(value) : value,
    ]),
  );
}

/** Fields that are results or choices wherever they stand, as patterns over paths with ids left as they are. */
const RESULTS: readonly RegExp[] = [
  /^scenarios\/[^/]+\/answers\/[^/]+\/(load|size)\/figure$/,
  /^scenarios\/[^/]+\/answers\/[^/]+\/(load|size)\/inputs\/(W|Q|Qm|A|P1|P2|relief_load|A_required)$/,
  /^scenarios\/[^/]+\/bound\/(figure|live|head)/,
  /^externalSheets\/[^/]+\/(figures|words)\//,
  /^externalSheets\/[^/]+\/inputs\/(W|Q|Qm|P1|P2|relief_load)$/,
  /^reliefPoints\/[^/]+\/(orifice|capacity|k)\//,
  /^reliefPoints\/[^/]+\/superimposed\//,
  /^lines\/[^/]+\/end\/(pressure|pressureMax)$/,
  /^lines\/[^/]+\/stability\//,
  /^justifications\/[^/]+\/values\//,
  /^fieldConditions\/[^/]+\/requires\//,
];
/** Text that is a name, a tag or a choice, not prose: it is left alone unless a pattern withholds it. */
const PROSE =
  /(^|\/)(note|text|title|service|words|reason|ref|location|special|exempt|note|kept|lowFlow|blowdown|history|first|second|what|name)$/;

export type MaskedDocument = Basis & { readonly masked: true };

function keyOf(element: unknown, index: number): string {
  return isNode(element) && typeof element['id'] === 'string' ? element['id'] : String(index);
}

function mask(value: unknown, path: string, readings: ReadonlySet<Path>): unknown {
  const result = readings.has(path) || RESULTS.some((pattern) => pattern.test(path));
  if (isRich(value)) return maskRich(value);
  if (isFigure(value)) return result ? withheldFigure(value) : value;
  if (Array.isArray(value))
    return value.map((each, index) => mask(each, join(path, keyOf(each, index)), readings));
  if (isNode(value))
    return Object.fromEntries(
      Object.entries(value).map(([key, each]) => [key, mask(each, join(path, key), readings)]),
    );
  if (typeof value === 'number' && result) return 0;
  if (typeof value !== 'string') return value;
  if (result) return HIDDEN_WORD;
  return PROSE.test(path) ? maskProse(value) : value;
}

const join = (path: string, part: string): string => (path === '' ? part : `${path}/${part}`);

/**
 * The document as a checker may see it before their unseen check is complete. Types stay those of a basis, so that pages
 * show it as any other: a withheld figure reads as not known, a withheld word as "[hidden]".
 * @param readings paths of the mandatory readings, whose values are withheld too
 */
export function maskDocument(doc: Basis, readings: readonly Path[] = []): MaskedDocument {
  const masked = mask(doc, '', new Set(readings)) as Basis;
  return { ...masked, masked: true };
}

/** Every reading that an unseen check of this document can ask for, whatever scenario the checker will choose. */
export function readingsOf(doc: Basis): Path[] {
  const ratings = doc.equipment.flatMap((item) => [
    ...item.sides.flatMap((side) =>
      side.ratings.flatMap((rating) =>
        ['mawp', 'at'].map((field) => `equipment/${item.id}/sides/${side.id}/ratings/${rating.id}/${field}`),
      ),
    ),
    `equipment/${item.id}/levels/fire`,
  ]);
  const points = doc.reliefPoints.flatMap((point) => [
    `reliefPoints/${point.id}/set`,
    `reliefPoints/${point.id}/cdtp`,
  ]);
  const lines = doc.lines.map((line) => `lines/${line.id}/end/to`);
  const sources = doc.sources.flatMap((source) =>
    ['valve/coefficient', 'pump/shutoff', 'orifice/bore', 'heat/duty'].map(
      (field) => `sources/${source.id}/${field}`,
    ),
  );
  const fluids = doc.fluids.flatMap((fluid) =>
    ['M', 'rhoLiquid', 'phase'].map((field) => `fluids/${fluid.id}/${field}`),
  );
  return [...ratings, ...points, ...lines, ...sources, ...fluids];
}
