/* Equipment of the invented site with its sides, code basis, fire zone and what the supplement adds. */
import { type Code, type Equipment, type F, type Side } from '@domain/basis';
import supplement from '../data/supplement/equipment.json';
import { type DemoEquipment, type DemoQ, type DemoSideFields, type DemoSystem } from './demo-types';
import { compact, figureOf, maybeFigure, originOf, rich } from './figures';
import { documentId, idOf, utilityId } from './ids';

type Table<T> = Record<string, T | undefined>;
const KINDS: Table<string> = supplement.kinds;
const CODES: Table<string> = supplement.codes;
const EDITIONS: Table<string> = supplement.editions;
const TESTS: Table<number> = supplement.tests;
const ELSEWHERE: Table<string | null> = supplement.elsewhere;
const SIDES: Table<{ at: DemoQ }> = supplement.sides;
const FIRE: Table<{ zone: string; drainage: boolean; ref?: string }> = supplement.fire;
const FIRE_BASIS: Table<string> = supplement.fireBasis;
const NO_DEVICE: Table<{ reason: string; text: string }> = supplement.noDevice;
const INSULATION: Table<{
  conductivity: DemoQ;
  intactHot: boolean;
  hoseStream: boolean;
  banded: boolean;
  ref: string;
}> = supplement.insulation;

/** The sides of an item: those named, else its body; jacket and coil are sides of their own. */
export function sideNames(equipment: DemoEquipment): string[] {
  if (equipment.sides) return Object.keys(equipment.sides);
  return ['body', ...(equipment.jacket ? ['jacket'] : []), ...(equipment.coil ? ['coil'] : [])];
}

function fieldsOfSide(equipment: DemoEquipment, name: string): DemoSideFields {
  if (equipment.sides) return equipment.sides[name] ?? {};
  if (name === 'jacket') return equipment.jacket ?? {};
  return name === 'coil' ? (equipment.coil ?? {}) : equipment;
}

function codeOf(equipment: DemoEquipment, units: 'SI' | 'US'): Code {
  const basis = (CODES[equipment.kind] ?? 'asme-viii-1') as Code['basis'];
  return compact({ basis, edition: EDITIONS[basis], units });
}

type Held = Pick<Side, 'holds'> & { system?: string };

function heldBy(key: string, fields: DemoSideFields): Held {
  const medium = fields.fluid ?? '';
  if (supplement.pressureless.includes(medium)) return { holds: 'pressureless' };
  const system = ELSEWHERE[medium];
  if (system === undefined || supplement.here.includes(key)) return { holds: 'here' };
  return system === null ? { holds: 'elsewhere' } : { holds: 'elsewhere', system: documentId(system) };
}

function testOf(key: string, mawp: DemoQ | undefined): Side['test'] {
  const ratio = TESTS[key];
  if (ratio === undefined || !mawp) return undefined;
  const value = Number((mawp.value * ratio).toPrecision(6));
  return {
    value,
    unit: mawp.unit,
    origin: { kind: 'plate', ref: `Stamp: hydrostatic test at ${String(ratio)} × MAWP` },
  };
}

function externalOf(equipment: DemoEquipment, key: string, name: string): Side['external'] {
  if (supplement.externalFull.includes(key)) return 'full-vacuum';
  if (name !== 'body' || !equipment.vacuum_rating) return undefined;
  return equipment.vacuum_rating === 'full vacuum' ? 'full-vacuum' : 'none';
}

function ratingsOf(sideId: string, key: string, fields: DemoSideFields): Side['ratings'] {
  if (!fields.mawp) return [];
  const at = maybeFigure(fields.design_temperature?.max ?? SIDES[key]?.at);
  return [compact({ id: `${sideId}_r1`, mawp: figureOf(fields.mawp), at })];
}

function sideOf(equipment: DemoEquipment, name: string, units: 'SI' | 'US'): Side {
  const fields = fieldsOfSide(equipment, name);
  const key = name === 'body' ? equipment.tag : `${equipment.tag}/${name}`;
  const id = idOf('sd', equipment.tag, name);
  const pressure = maybeFigure(fields.operating?.pressure ?? fields.operating_pressure);
  const operating = pressure
    ? compact({ normal: pressure, max: pressure, temperature: maybeFigure(fields.operating?.temperature) })
    : undefined;
  return compact({
    id,
    name,
    ...heldBy(key, fields),
    medium: fields.fluid,
    code: fields.mawp ? codeOf(equipment, units) : undefined,
    ratings: ratingsOf(id, key, fields),
    mdmt: maybeFigure(fields.design_temperature?.min),
    designVacuum: name === 'body' ? vacuumOf(equipment.design_vacuum) : undefined,
    external: externalOf(equipment, key, name),
    test: testOf(key, fields.mawp),
    operating,
  });
}

/** Vacuum is stored as a positive figure below atmosphere. */
function vacuumOf(q: DemoQ | undefined): Side['designVacuum'] {
  return q && figureOf({ ...q, value: Math.abs(q.value), unit: q.unit.replace('_g', '') });
}

function shapeOf(equipment: DemoEquipment): Equipment['shape'] {
  const tubes = equipment.tubes && {
    count: equipment.tubes.count,
    bore: figureOf(equipment.tubes.inside_diameter),
  };
  if (equipment.kind === 'piping') return undefined;
  const shape = compact({
    orientation: equipment.orientation as 'vertical' | 'horizontal' | undefined,
    diameter: maybeFigure(equipment.inside_diameter),
    length: maybeFigure(equipment.tangent_length),
    roof: equipment.roof,
    heads: equipment.heads as 'ellipsoidal' | 'flat' | undefined,
    tubes,
  });
  return Object.keys(shape).length > 0 ? shape : undefined;
}

/** Pipes have no head and no level: their bore and length stand in their name. */
function nameOf(equipment: DemoEquipment): string | undefined {
  const { inside_diameter: bore, length } = equipment;
  if (equipment.kind !== 'piping' || !bore || !length) return undefined;
  return `Pipe of ${String(bore.value)} ${bore.unit} bore, ${String(length.value)} ${length.unit} long`;
}

/** A level of nought says that there is no liquid. */
function levelOf(q: DemoQ): F | undefined {
  return q.value === 0 ? undefined : figureOf(q);
}

function levelsOf(equipment: DemoEquipment): Equipment['levels'] {
  const levels = equipment.levels;
  if (!levels) return undefined;
  const fireBasis = FIRE_BASIS[equipment.kind] as NonNullable<Equipment['levels']>['fireBasis'];
  return compact({
    normal: levelOf(levels.normal),
    high: levelOf(levels.high),
    fire: levelOf(levels.fire),
    fireBasis: levels.fire.value === 0 ? undefined : fireBasis,
  });
}

function insulationOf(equipment: DemoEquipment): Equipment['insulation'] {
  const own = equipment.insulation;
  if (!own) return undefined;
  const proof = INSULATION[equipment.tag];
  const proven = proof
    ? {
        conductivity: figureOf(proof.conductivity),
        intactHot: proof.intactHot,
        hoseStream: proof.hoseStream,
        banded: proof.banded,
        ref: proof.ref,
      }
    : {};
  return compact({
    material: own.material,
    thickness: maybeFigure(own.thickness),
    fireCredit: own.fire_credit,
    ...proven,
  });
}

function fireOf(equipment: DemoEquipment): Equipment['fire'] {
  const fire = FIRE[equipment.tag];
  return fire && compact({ zone: utilityId(fire.zone), drainage: fire.drainage, drainageRef: fire.ref });
}

function noDeviceOf(tag: string): Equipment['noDevice'] {
  const own = NO_DEVICE[tag];
  return own && { reason: own.reason as 'cannot-exceed', text: rich(own.text) };
}

/** One item of equipment. */
export function equipmentOf(equipment: DemoEquipment, system: DemoSystem): Equipment {
  return compact({
    id: idOf('eq', equipment.tag),
    tag: equipment.tag,
    name: nameOf(equipment),
    origin: originOf(equipment.origin),
    kind: (KINDS[equipment.tag] ?? equipment.kind.replace(' ', '-')) as Equipment['kind'],
    sides: sideNames(equipment).map((name) => sideOf(equipment, name, system.unit_system)),
    contents: equipment.contents,
    volume: maybeFigure(equipment.volume),
    shape: shapeOf(equipment),
    elevation: maybeFigure(equipment.elevation_of_bottom),
    levels: levelsOf(equipment),
    insulation: insulationOf(equipment),
    fire: fireOf(equipment),
    noDevice: noDeviceOf(equipment.tag),
  });
}

/** `E-201:shell` and `E-201/shell` name a side; a bare tag names the item. */
export function placeOf(name: string): { equipment: string; side?: string } {
  const [tag = '', side] = name.split(/[:/]/);
  const equipment = idOf('eq', tag);
  return side === undefined ? { equipment } : { equipment, side: idOf('sd', tag, side) };
}
