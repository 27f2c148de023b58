/* The two relief headers of the invented site as header documents. */
import { type Header } from '@domain/header';
import utilities from '../data/supplement/utilities.json';
import { type DemoHeader } from './demo-types';
import { figureOf, rich } from './figures';
import { groupId } from './groups';
import { documentId, idOf, unitId, utilityId } from './ids';
import { segmentOf } from './lines';
import { scenarioKey } from './keys';

const KEY_OF: Record<string, string> = {
  CW: 'cooling-water-loss',
  POWER: 'electric-power-loss',
  'FIRE-100': 'fire-wetted',
  'FIRE-200': 'fire-wetted',
  'FIRE-300': 'fire-wetted',
  'COOL-300': 'runaway-reaction',
  BLOWBY: 'gas-blow-by',
};
const FIRE_ZONE: Record<string, string> = {
  'FIRE-100': 'FZ-100',
  'FIRE-200': 'FZ-206',
  'FIRE-300': 'FZ-300',
};
const OF_SCENARIO: Record<string, string | undefined> = utilities.ofScenario;

/** The id of a common cause inside its header. */
export const causeId = (id: string): string => idOf('cc', id);

/** The nodes of a header from the flare upstream; the tip first. */
function nodesOf(header: DemoHeader): Header['nodes'] {
  const tip = header.segments[0]?.from ?? 'tip';
  const names = header.segments.map((segment) => segment.to ?? '');
  return [{ id: 'nd_tip', name: tip, tip: true }, ...names.map((name) => ({ id: idOf('nd', name), name }))];
}

function causesOf(header: DemoHeader): Header['causes'] {
  return header.scenarios.map((scenario) => {
    const key = KEY_OF[scenario.id] ?? scenario.id;
    const utility = FIRE_ZONE[scenario.id] ?? OF_SCENARIO[key];
    return {
      id: causeId(scenario.id),
      key,
      name: scenario.name,
      text: rich(scenario.common_cause),
      ...(utility === undefined ? {} : { utility: utilityId(utility) }),
      loads: scenario.members.map((member) => ({
        id: idOf('ld', scenario.id, member.system),
        system: documentId(member.system),
        scenario: scenarioKey(member.cause),
        group: groupId(member.group),
        node: idOf('nd', member.tie_in),
      })),
    };
  });
}

function segmentsOf(header: DemoHeader): Header['segments'] {
  const tip = header.segments[0]?.from;
  return header.segments.map((segment) => ({
    ...segmentOf(segment, idOf('sg', segment.id), segment.inside_diameter.origin?.reference ?? header.id),
    from: segment.from === tip ? 'nd_tip' : idOf('nd', segment.from ?? 'tip'),
    to: idOf('nd', segment.to ?? ''),
  }));
}

function membersOf(header: DemoHeader): Header['members'] {
  return Object.entries(header.tie_ins).flatMap(([node, systems]) =>
    systems.map((system) => ({ id: idOf('hm', system), system: documentId(system), node: idOf('nd', node) })),
  );
}

/** One header document. */
export function headerOf(header: DemoHeader): Header {
  return {
    schema: 1,
    id: documentId(header.id),
    tag: header.id,
    name: header.name,
    unit: unitId(header.unit),
    service: header.service,
    disposesTo: header.disposes_to,
    note: header.note,
    normal: {
      ...figureOf(header.normal_pressure),
      origin: { kind: 'field-reading', ref: 'PI-601 and PI-602, mean of 2025' },
    },
    viscosity: figureOf(header.gas_viscosity),
    limits: {
      mach: { ...figureOf(header.limits.Mach), origin: { kind: 'judgement', ref: 'Site rule SR-7' } },
    },
    nodes: nodesOf(header),
    segments: segmentsOf(header),
    members: membersOf(header),
    references: [
      { id: 'ref_1', title: `Header model of ${header.id}`, names: [header.id], kind: 'simulation' },
    ],
    assumptions: [
      {
        id: 'as_1',
        text: rich('Isothermal flow from the tip upstream; mixing temperature weighted by mass.'),
      },
    ],
    causes: causesOf(header),
    justifications: [],
  };
}
