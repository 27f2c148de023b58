/* One small system with a worked change, and the facts of a case on it that has all its points open or closed at will. */
import { type Basis, parseBasis } from '@domain/basis';
import {
  type Case,
  type DocumentFacts,
  type Gate,
  type GateFacts,
  openPoints,
  type Rich,
  type Signature,
} from '@domain/case';
import { type Evaluation, type Sheet } from '@domain/evaluate';
import { type Q } from '@engine/quantity';
import { type Outcome } from '@domain/rulebook/types';

export const says = (text: string): Rich => ({
  type: 'doc',
  content: [{ type: 'paragraph', content: [{ type: 'text', text }] }],
});
export const q = (value: number, unit: string): Q => ({ value, unit });

const LONG = 'The drawing and the data sheet show it, and the tag V-1 is on the plate.';

/** A vessel V-1 with one valve PSV-1 to atmosphere, two credible scenarios, one set aside. */
// prettier-ignore
export function basis(over: Record<string, unknown> = {}): Basis {
  const answer = (id: string) => ({ id, fluid: 'f1', group: 'g1', load: { by: 'given', figure: q(9000, 'kg/h') }, size: { by: 'none' }, accumulation: 'single' });
  const scenario = (id: string, more: Record<string, unknown>) => ({ id, key: id, statuses: { normal: true }, reason: says(LONG), answers: [], ...more });
  const raw = {
    schema: 1, id: 'doc1', tag: 'SYS-1', name: 'Knock-out drum', unit: 'u1', service: 'vapour', units: 'SI', grade: 'worked',
    boundary: { text: says(LONG), paths: [] },
    equipment: [{ id: 'e1', tag: 'V-1', kind: 'drum', levels: { fire: q(1.2, 'm') }, sides: [{ id: 's1', name: 'shell', holds: 'here', code: { basis: 'asme-viii-1', units: 'SI' }, ratings: [{ id: 'r1', mawp: { ...q(10, 'bar_g'), text: '10.0' }, at: q(150, 'degC') }] }] }],
    sources: [{ id: 'src1', tag: 'FV-1', kind: 'control-valve', valve: { coefficient: q(63, 'Kv') } }],
    fluids: [{ id: 'f1', name: 'feed vapour', phase: 'vapour', from: { kind: 'own' }, M: q(44.1, 'kg/kmol') }],
    reliefPoints: [{
      id: 'p1', tag: 'PSV-1', axes: { actuation: ['pressure'], holds: 'spring', recloses: 'yes', balance: 'none', action: 'pop', lift: 'full', direction: 'over', certifiedFor: ['gas'] },
      service: 'in-service', duty: 'gas', purpose: 'process', orifice: { letter: 'M' }, set: { ...q(10, 'bar_g'), text: '10.0' }, cdtp: { ...q(10.2, 'bar_g'), text: '10.20' },
      inlet: { nominal: '4 in' }, outlet: { nominal: '6 in' }, capacity: { of: q(12000, 'kg/h'), medium: 'air' },
    }],
    groups: [{ id: 'g1', limiting: { equipment: 'e1', side: 's1' }, covers: [], members: [{ id: 'm1', point: 'p1', credited: true, place: 'first' }] }],
    isolations: [{ id: 'i1', tag: 'HV-1', where: 'inlet', protects: ['p1'], kind: 'gate', kept: 'open', lock: { kind: 'car-seal', number: 'S-2209' } }],
    interlocks: [], segments: [],
    lines: [{ id: 'l1', point: 'p1', side: 'outlet', path: [], end: { to: 'atmosphere', location: 'roof of unit 1' } }],
    scenarios: [
      scenario('inlet-control-valve-open', { disposition: 'credible', sources: ['src1'], answers: [answer('a1')] }),
      scenario('fire-wetted', { disposition: 'credible', answers: [answer('a2')] }),
      scenario('tube-rupture', { disposition: 'not-applicable' }),
    ],
    externalSheets: [], fieldConditions: [{ id: 'c1', tag: 'FV-1-STOP', kind: 'travel-stop', requires: { words: 'at 80 %' }, photo: true }],
    references: [], once: [], assumptions: [], justifications: [], neighbours: [], imports: [],
    ...over,
  }; // the object is checked by the schema below
  const parsed = parseBasis(raw);
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.problem));
  return parsed.value;
}

const sheet = (key: string, outputs: Sheet['outputs'], hash: string): Sheet => ({
  key,
  method: 'a.gas@1',
  inputs: {},
  from: {},
  steps: [],
  outputs,
  hash,
  warnings: [],
});

/** The control valve governs with 92 % of the installed area; `area` and `hash` move it. */
// prettier-ignore
export function evaluation(area = 2130, hash = 'now'): Evaluation {
  const sheets: Record<string, Sheet> = {};
  for (const [key, load, required] of [['inlet-control-valve-open/a1', 13909.6, area], ['fire-wetted/a2', 9000, 1400]] as const) {
    sheets[`limit:${key}`] = sheet(`limit:${key}`, { MAAP: q(11, 'bar_g'), P1: q(12.013, 'bar_abs') }, `limit-${hash}`);
    sheets[`load:${key}`] = sheet(`load:${key}`, { relief_load: q(load, 'kg/h') }, `load-${hash}`);
    sheets[`size:${key}`] = sheet(`size:${key}`, { A_required: q(required, 'mm2') }, `size-${hash}`);
  }
  return {
    key: hash, engine: '0.1.0', methods: ['a.gas@1'], sheets,
    groups: { g1: { governing: 'size:inlet-control-valve-open/a1', use: area / 2323, verdict: 'marginal' } },
    points: { p1: { inletLoss: q(0.21, 'bar'), total: q(0.9, 'bar_g'), verdict: 'marginal' } },
    figures: {},
  };
}

// prettier-ignore
export function outcome(over: Partial<Outcome> = {}): Outcome {
  return { code: 'set-above-mawp', subject: 'reliefPoints/p1/set', tag: 'PSV-1', sentence: 'PSV-1 is set at 12 barg, above the MAWP 10 barg of V-1.', where: '', severity: 'stop', values: {}, inherited: false, hash: 'h'.repeat(64), ...over };
}

// prettier-ignore
export function aCase(over: Partial<Case> = {}): Case {
  return {
    id: 'case1', number: 'KW-2026-003', class: 'permanent', stage: 'scenarios', raisedBy: 'ann', raisedAt: '2026-03-01T08:00:00.000Z', version: 1, rules: 1,
    brief: { title: 'Bigger trim', whatChanges: says('The trim of FV-1 grows.'), technicalBasis: says('Feed rises by a fifth.'), effect: says('More load on PSV-1.'), timeNeeded: 'two shifts', papers: [{ id: 'n', kind: 'none', reference: 'none touched', from: '', to: '', when: 'after', state: 'issued' }] },
    documents: [{ document: 'doc1', why: 'own', base: 'rev1', working: 'rev2', state: 'open' }],
    seats: [
      { id: 's1', role: 'originator', person: 'ann' }, { id: 's2', role: 'checker', person: 'ben' },
      { id: 's3', role: 'approver', person: 'eva' }, { id: 's4', role: 'operations', person: 'tom' },
    ],
    affected: [], extensions: [], ...over,
  };
}

// prettier-ignore
export function documentFacts(over: Partial<DocumentFacts> = {}): DocumentFacts {
  const doc = basis();
  return { document: 'doc1', tag: 'SYS-1', state: 'open', base: 'rev1', inForce: 'rev1', doc, baseDoc: doc, evaluation: evaluation(), baseEvaluation: evaluation(), outcomes: [], ...over };
}

/** A case with nothing open at any gate but what a test adds. */
// prettier-ignore
export function facts(over: Partial<GateFacts> = {}): GateFacts {
  return {
    today: '2026-03-20', case: aCase(), names: { ann: 'Ann', ben: 'Ben', eva: 'Eva', tom: 'Tom', doc9: 'SYS-9' },
    roles: { ann: ['originator'], ben: ['checker'], eva: ['approver'], tom: ['operations'] },
    rules: { approvers: 1, affectedAnswerAge: 90, temporaryMax: 90, extensionsMax: 1, approvalAge: 12, shortfallMax: 90, reasonLength: 40 },
    ruleGates: { 'set-above-mawp': 'scenarios', 'only-at-approval': 'approval' }, documents: [documentFacts()], signatures: [], agreements: [], unseen: [], reveals: [], findings: [], dueItems: [],
    field: { lines: [], entries: [], discrepancies: [] }, authors: [], views: [], hidden: false, ...over,
  };
}

/** Codes of the open points of a gate. */
export const codes = (gate: Gate, over: Partial<GateFacts>, document?: string): string[] =>
  openPoints(gate, facts(over), document).map((each) => each.code);

/** What the open points of a gate say. */
export const sentences = (gate: Gate, over: Partial<GateFacts>): string[] =>
  openPoints(gate, facts(over)).map((each) => each.sentence);

/** A signature of a gate, valid unless said otherwise. */
export const signed = (
  gate: string,
  at = '2026-03-10T08:00:00.000Z',
  valid = true,
): Signature & { valid: boolean } => ({
  id: gate,
  gate,
  person: 'x',
  name: 'X',
  role: 'x',
  meaning: 'm',
  at,
  zone: 'UTC',
  page: 'p',
  hash: 'h',
  bound: [],
  factor: 'password',
  valid,
});
