/* Devices of the invented site as relief points: what is required of the thing on the nozzle. */
import { type F, type ReliefPoint } from '@domain/basis';
import supplement from '../data/supplement/equipment.json';
import { axesOf, dutyOf, isVent, purposeOf } from './axes';
import { type DemoDevice, type DemoQ, type DemoSystem } from './demo-types';
import { placeOf } from './equipment';
import { compact, figureOf, maybeFigure, plainQ } from './figures';
import { idOf } from './ids';

/** The id of the relief point of a tag. */
export const pointId = (tag: string): string => idOf('rp', tag);

const CERTIFICATE = { kind: 'maker' as const, ref: 'Manufacturer certified data' };
const SPECIFICATION = (tag: string): string => `Valve specification sheet DS-${tag}`;
const DISKS: Record<string, Partial<NonNullable<ReliefPoint['disk']>> | undefined> =
  supplement.disks as never;

const BALANCED_VENT: Record<string, string | undefined> = supplement.balancedVent;

function specified(q: DemoQ | undefined, tag: string): F | undefined {
  return q && { ...figureOf(q), origin: { kind: 'data-sheet' as const, ref: SPECIFICATION(tag) } };
}

/** Vacuum sets are stored positive, in mbar below atmosphere. */
function vacuum(q: DemoQ | undefined, tag: string): F | undefined {
  return q && specified({ value: Math.abs(q.value), unit: q.unit.replace('_g', '') }, tag);
}

function connections(device: DemoDevice): Pick<ReliefPoint, 'inlet' | 'outlet'> {
  const text = device.connections ?? device.size_text;
  if (text === undefined) return {};
  const [first, second] = text.split(' x ');
  const unit = text.endsWith(' in') ? ' in' : '';
  const inlet = { nominal: first + (unit !== '' && !String(first).endsWith(unit) ? unit : '') };
  if (second === undefined) return { inlet };
  return { inlet, outlet: { nominal: text.startsWith('DN') ? `DN ${second}` : second } };
}

function orificeOf(device: DemoDevice): ReliefPoint['orifice'] {
  const effective = device.effective_area && { ...figureOf(device.effective_area), origin: CERTIFICATE };
  const net = device.burst && { ...figureOf(device.burst.minimum_net_flow_area), origin: CERTIFICATE };
  const area = isVent(device) ? undefined : (effective ?? net);
  const actual = maybeFigure(device.actual_area) ?? (isVent(device) ? effective : net);
  return compact({
    letter: device.letter,
    effective: area,
    actual,
    vacuum: maybeFigure(device.vacuum_flow_area),
  });
}

function coefficients(device: DemoDevice): ReliefPoint['k'] {
  const certified = maybeFigure(device.K_certified);
  const liquid = device.service === 'liquid';
  const judged = { kind: 'maker' as const, ref: device.Kb_basis ?? 'No correction applies' };
  const factor = (q: DemoQ | undefined): F | undefined => q && { ...figureOf(q), origin: judged };
  return compact({
    gas: liquid ? undefined : certified,
    liquid: liquid ? certified : undefined,
    kb: factor(device.Kb),
    kw: factor(device.Kw),
    kc: factor(device.Kc),
    note: device.Kb_basis,
  });
}

function bonnetOf(device: DemoDevice): ReliefPoint['bonnet'] {
  const bonnet = device.bonnet;
  if (bonnet === undefined) return undefined;
  if (bonnet.startsWith('open')) return { kind: 'open', lever: 'plain' };
  if (bonnet === 'vented')
    return compact({ kind: 'vented' as const, vent: 'piped' as const, ventTo: device.bonnet_vent });
  const ventTo = BALANCED_VENT[device.tag];
  if (ventTo !== undefined) return { kind: 'closed', lever: 'none', plug: 'out', vent: 'piped', ventTo };
  const note = bonnet === 'closed' ? undefined : bonnet;
  return compact({ kind: 'closed' as const, lever: 'none' as const, plug: 'in' as const, note });
}

function pilotOf(device: DemoDevice): ReliefPoint['pilot'] {
  const pilot = device.pilot;
  if (!pilot) return undefined;
  return {
    sensing: pilot.sensing.startsWith('remote') ? 'remote' : 'at-valve',
    at: pilot.sensing,
    filter: pilot.filter === 'fitted',
    backflowPreventer: pilot.backflow_preventer === 'fitted',
  };
}

/** A listed temperature and pressure valve on hot-water storage needs no energy from outside. */
const TEMPERATURE_AND_PRESSURE: NonNullable<ReliefPoint['power']> = {
  signal: 'water temperature at the element, or pressure',
  energy: 'self-acting',
  failsTo: 'open',
  listed: 't-and-p',
};

function powerOf(device: DemoDevice): ReliefPoint['power'] {
  const power = device.actuation;
  if (device.kind === 'temperature-actuated') return TEMPERATURE_AND_PRESSURE;
  return (
    power && { signal: power.signal, energy: power.energy, failsTo: power.fails === 'open' ? 'open' : 'shut' }
  );
}

function thermalOf(device: DemoDevice): ReliefPoint['thermal'] {
  const element = device.thermal_element;
  return (
    element && {
      opensAt: figureOf(element.opens_at),
      fullAt: figureOf(element.full_open_at),
      note: element.note,
    }
  );
}

function diskOf(device: DemoDevice): ReliefPoint['disk'] {
  const burst = device.burst;
  if (!burst) return undefined;
  const marked = burst.marked_burst_pressure;
  const tolerance = { value: Number((burst.tolerance.value / marked.value).toPrecision(4)), unit: '-' };
  const ratio = DISKS[device.tag]?.ratio;
  return compact({
    ...DISKS[device.tag],
    ratio: typeof ratio === 'number' ? { value: ratio, unit: '-', origin: CERTIFICATE } : undefined,
    burst: specified(marked, device.tag) ?? plainQ(marked),
    at: figureOf(burst.at_temperature),
    range: { value: burst.manufacturing_range.value / 100, unit: '-' },
    tolerance: { ...tolerance, origin: CERTIFICATE },
    netArea: figureOf(burst.minimum_net_flow_area),
    kr: maybeFigure(burst.resistance_factor),
    fragments: false,
    lot: burst.lot,
    method: burst.resistance_factor ? ('resistance' as const) : ('coefficient' as const),
    note: burst.installation,
  });
}

function withOf(device: DemoDevice): ReliefPoint['with'] {
  const disk = device.rupture_disk_in_combination;
  if (disk == null) return undefined;
  return compact({
    disk: pointId(disk),
    side: 'inlet' as const,
    space: 'tell-tale' as const,
    spaceNote: device.combination?.space_between,
    leakStated: true,
  });
}

type Spring = { lo: number; hi: number; unit: string; number: string };
const SPRINGS: Record<string, Spring[] | undefined> = supplement.springs;

/** The spring that holds the cold setting, where the maker's chart of springs is known. */
function springOf(device: DemoDevice): ReliefPoint['spring'] {
  const cold = device.nameplate.cold_differential_test_pressure?.value;
  const spring = SPRINGS[device.tag]?.find(
    (candidate) => cold !== undefined && cold >= candidate.lo && cold < candidate.hi,
  );
  if (!spring) return undefined;
  const origin = { kind: 'maker' as const, ref: `Spring chart, spring ${spring.number}` };
  const at = (value: number): F => ({ value, unit: spring.unit, origin });
  return { lo: at(spring.lo), hi: at(spring.hi), number: spring.number };
}

function settings(device: DemoDevice): Partial<ReliefPoint> {
  const spec = (q: DemoQ | undefined): F | undefined => specified(q, device.tag);
  return {
    overpressure: spec(device.overpressure),
    blowdown: spec(device.blowdown),
    set: spec(device.set_pressure),
    setVacuum: vacuum(device.set_vacuum, device.tag),
    fullFlow: spec(device.full_flow_pressure),
    fullFlowVacuum: vacuum(device.full_flow_vacuum, device.tag),
    cdtp: spec(device.nameplate.cold_differential_test_pressure),
    temperatureFactor: spec(device.temperature_multiplier),
    spring: springOf(device),
  };
}

function serviceOf(device: DemoDevice): ReliefPoint['service'] {
  return device.role === 'installed spare' ? 'spare' : 'in-service';
}

/** One relief point. */
export function pointOf(device: DemoDevice, system: DemoSystem): ReliefPoint {
  const group = system.groups.find((candidate) => candidate.devices.includes(device.tag));
  const on = group && placeOf(group.limiting_equipment);
  const interval = device.last_test && { value: device.last_test.interval_months, unit: 'months' };
  return compact({
    id: pointId(device.tag),
    tag: device.tag,
    name: device.description,
    on,
    axes: axesOf(device),
    service: serviceOf(device),
    duty: dutyOf(device),
    ...connections(device),
    purpose: purposeOf(device),
    orifice: orificeOf(device),
    k: coefficients(device),
    ...settings(device),
    seat: device.seat as 'metal' | 'soft' | undefined,
    bonnet: bonnetOf(device),
    pilot: pilotOf(device),
    power: powerOf(device),
    thermal: thermalOf(device),
    disk: diskOf(device),
    with: withOf(device),
    mark: { code: device.nameplate.code_symbol, certificate: `Certificate ${device.nameplate.serial}` },
    test: interval && {
      interval: {
        ...interval,
        origin: { kind: 'judgement' as const, ref: 'Written scheme of examination WS-00' },
      },
    },
  });
}
