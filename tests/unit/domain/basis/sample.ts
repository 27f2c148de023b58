/* A small relief basis of the invented site for the tests of documents: one column, two relief points, two scenarios. */
import { parseBasis, richFromText, type Basis } from '@domain/basis';

const drawing = { kind: 'drawing', ref: 'Vessel drawing 101-D-010 rev 4' };
const barg = (value: number) => ({ value, unit: 'bar_g', origin: drawing });
const axes = {
  actuation: ['pressure'],
  holds: 'spring',
  recloses: 'yes',
  balance: 'bellows',
  action: 'pop',
  lift: 'full',
  direction: 'over',
  certifiedFor: ['gas', 'liquid'],
};

function point(id: string, tag: string) {
  return {
    id,
    tag,
    on: { equipment: 'eq_c101', side: 'sd_c101' },
    axes,
    service: 'in-service',
    duty: 'gas',
    purpose: 'process',
    orifice: { letter: 'L', effective: { value: 1841, unit: 'mm2' }, actual: { value: 2099, unit: 'mm2' } },
    k: { gas: { value: 0.868, unit: '-' } },
    set: barg(3.5),
    overpressure: { value: 0.1, unit: 'fraction' },
    blowdown: { value: 0.07, unit: 'fraction' },
  };
}

function column() {
  return {
    id: 'eq_c101',
    tag: 'C-101',
    kind: 'column',
    sides: [
      {
        id: 'sd_c101',
        name: 'shell',
        holds: 'here',
        code: { basis: 'asme-viii-1', units: 'SI' },
        ratings: [{ id: 'rt_1', mawp: barg(3.5), at: { value: 185, unit: 'degC' } }],
        external: 'full-vacuum',
        operating: { normal: barg(0.35) },
      },
    ],
    levels: { normal: { value: 1.6, unit: 'm' } },
  };
}

function scenarios() {
  return [
    {
      id: 'cooling-water-loss',
      key: 'cooling-water-loss',
      statuses: { normal: true, 'start-up': true },
      reason: richFromText('All vapour of the reboiler must leave when the condenser is lost.'),
      sources: ['src_e102'],
      disposition: 'credible',
      answers: [
        {
          id: 'ans_1',
          fluid: 'fl_1',
          group: 'gr_1',
          load: { by: 'given', figure: { value: 9400, unit: 'kg/h' } },
          size: {
            by: 'method',
            method: 'a.gas',
            inputs: { T: { value: 96, unit: 'degC' }, Kb: { use: 'reliefPoints/rp_a/k/gas' } },
          },
          accumulation: 'single',
        },
      ],
    },
    {
      id: 'tube-rupture~2',
      key: 'tube-rupture',
      about: ['src_e102'],
      statuses: { normal: true },
      reason: richFromText('The low side was tested above the high side.'),
      answers: [],
      disposition: 'below-limit',
      bound: {
        figure: { value: 4.4, unit: 'bar_g' },
        limit: { equipment: 'eq_c101', side: 'sd_c101', of: 'mawp' },
      },
    },
  ];
}

export function sampleInput(): Record<string, unknown> {
  return {
    schema: 1,
    id: 'doc_101',
    tag: 'SYS-101',
    name: 'Acetone column C-101',
    unit: 'un_100',
    service: 'Spent-solvent distillation',
    units: 'SI',
    grade: 'worked',
    boundary: {
      text: richFromText('Column with reboiler and condenser.'),
      paths: [{ id: 'bp_1', equipment: 'eq_c101', point: 'rp_a' }],
    },
    equipment: [column()],
    sources: [{ id: 'src_e102', tag: 'E-102', kind: 'exchanger', heat: { ua: { value: 42, unit: 'kW/K' } } }],
    fluids: [
      {
        id: 'fl_1',
        name: 'Acetone vapour',
        phase: 'vapour',
        from: { kind: 'own' },
        M: { value: 58.08, unit: 'kg/kmol' },
      },
    ],
    reliefPoints: [point('rp_a', 'PSV-101A'), point('rp_b', 'PSV-101B')],
    groups: [
      {
        id: 'gr_1',
        limiting: { equipment: 'eq_c101', side: 'sd_c101' },
        covers: [{ id: 'cv_1', equipment: 'eq_c101' }],
        members: [
          { id: 'mb_1', point: 'rp_a', credited: true, place: 'first' },
          { id: 'mb_2', point: 'rp_b', credited: false, place: 'spare' },
        ],
      },
    ],
    isolations: [],
    interlocks: [],
    segments: [
      {
        id: 'sg_1',
        nominal: 'DN 100',
        bore: { value: 102.3, unit: 'mm' },
        length: { value: 1.2, unit: 'm' },
        fittings: [],
      },
      {
        id: 'sg_2',
        nominal: 'DN 150',
        bore: { value: 154.1, unit: 'mm' },
        length: { value: 8, unit: 'm' },
        fittings: [],
      },
    ],
    lines: [
      { id: 'ln_1', point: 'rp_a', side: 'inlet', path: ['sg_1'] },
      { id: 'ln_2', point: 'rp_a', side: 'outlet', path: ['sg_2'] },
    ],
    scenarios: scenarios(),
    externalSheets: [],
    fieldConditions: [],
    references: [{ id: 'ref_1', title: 'Vessel drawing 101-D-010 rev 4', names: ['C-101'], kind: 'drawing' }],
    once: [],
    assumptions: [],
    justifications: [],
    neighbours: [],
    imports: [],
  };
}

/** The sample, parsed. */
export function sample(): Basis {
  const parsed = parseBasis(sampleInput());
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.problem));
  return parsed.value;
}

/** A basis of about 40 kB, the largest of the invented site: the sample with its scenarios written many times over. */
export function largeSample(): Basis {
  const basis = sample();
  const scenarios = Array.from({ length: 60 }, (_, index) => {
    const one = basis.scenarios[index % 2]!;
    return { ...one, id: `${one.key}~${String(index)}` };
  });
  const reliefPoints = Array.from({ length: 12 }, (_, index) => ({
    ...basis.reliefPoints[0]!,
    id: `rp_${String(index)}`,
  }));
  return { ...basis, scenarios, reliefPoints: [...basis.reliefPoints, ...reliefPoints] };
}
