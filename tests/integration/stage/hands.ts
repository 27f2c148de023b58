/* What the people of a case do between its gates: raise, describe, nominate, change, check unseen, see the field. */
import { originatorsValue, unseenState, type Brief, type CaseClass, changedSheets } from '@domain/case';
import { addDays } from '@domain/dates';
import { richFromText } from '@domain/text';
import { today } from '@services/context';
import { agreeSheet } from '@services/check/agree';
import { enterUnseen, revealUnseen } from '@services/check/unseen';
import { answerAffected } from '@services/edit/affected';
import { editBrief } from '@services/edit/brief';
import { editDocument, type OpsBody } from '@services/edit/document';
import { raiseCase } from '@services/edit/raise';
import { nominate } from '@services/edit/seats';
import { enterField } from '@services/field/enter';
import { keepPhotograph } from '@services/field/photographs';
import { turnDue } from '@services/due/turn';
import { act, factsOf, fileOf, type Plant, sent, value } from './plant';

export const TEAM = { originator: 'Owen', checker: 'Ilse', approvers: ['Grace'], operations: 'Tomas' };
export type Team = typeof TEAM;

const BRIEF: Partial<Brief> = {
  whatChanges: richFromText('The feed pump gets the larger impeller, and the reboiler its new bundle.'),
  technicalBasis: richFromText('Pump curve and rating sheet of the maker.'),
  effect: richFromText('More feed, more vapour to be relieved; no new hazard.'),
  timeNeeded: 'two days',
  papers: [
    {
      id: 'pp_1',
      kind: 'drawing',
      reference: '100-P-101',
      from: 'rev 4',
      to: 'rev 5',
      when: 'before-start-up',
      state: 'not-started',
    },
    {
      id: 'pp_2',
      kind: 'procedure',
      reference: 'OP-101',
      from: 'rev 2',
      to: 'rev 3',
      when: 'after',
      state: 'not-started',
    },
  ],
};

/** A case in draft, described and with its people. */
export async function raised(
  of: Plant,
  systems: string[],
  options: { class?: CaseClass; team?: Team; brief?: Partial<Brief> } = {},
): Promise<string> {
  const team = options.team ?? TEAM;
  const origin = of.who(team.originator);
  const body = { class: options.class ?? 'permanent', title: 'New impeller and bundle', systems };
  const { number } = value(await raiseCase(of.ctx, origin, sent(body)));
  const brief = { ...BRIEF, ...options.brief };
  value(await editBrief(of.ctx, origin, number, sent(brief, 1)));
  const seats = [
    { role: 'checker' as const, person: of.who(team.checker).person.id },
    ...team.approvers.map((name) => ({ role: 'approver' as const, person: of.who(name).person.id })),
    { role: 'operations' as const, person: of.who(team.operations).person.id },
  ];
  value(await nominate(of.ctx, origin, number, sent({ seats }, 2)));
  return number;
}

/** Says of every affected system that it is not reached, with a reason. */
export async function answered(of: Plant, number: string, by = TEAM.originator): Promise<void> {
  const { affected } = await fileOf(of, number);
  for (const one of affected) {
    const { row } = await fileOf(of, number);
    const reason = 'Its own sources and limits stand as they are, and the shared header keeps its pressure.';
    const body = { document: one.documentId, answer: 'not-affected' as const, reason };
    value(await answerAffected(of.ctx, of.who(by), number, sent(body, row.version)));
  }
}

/** Changes the working revision of a system by ops. */
export async function changed(
  of: Plant,
  number: string,
  system: string,
  ops: OpsBody['ops'],
  by = TEAM.originator,
): Promise<void> {
  const file = await fileOf(of, number);
  const working = file.documents.find((one) => one.document.tag === system)?.working;
  value(await editDocument(of.ctx, of.who(by), { number, system }, sent({ ops }, working?.version ?? 0)));
}

/** Enters unseen whatever is asked, each time as the originator has it, until both sides may be shown; then shows them. */
export async function checkedUnseen(of: Plant, number: string, by = TEAM.checker): Promise<void> {
  for (let round = 0; round < 20; round += 1) {
    const facts = await factsOf(of, number);
    const of1 = facts.documents.find((one) => !['reveal', 'done'].includes(unseenState(one, facts).step));
    if (!of1) break;
    const entries = unseenState(of1, facts).mayEnter.map((item) => {
      const theirs = originatorsValue(of1, item) ?? 'none';
      const what = typeof theirs === 'string' ? { word: theirs } : { value: theirs };
      return { document: of1.document, scope: item.scope, ...what, cites: 'the drawing' };
    });
    const { version } = (await fileOf(of, number)).row;
    value(await enterUnseen(of.ctx, of.who(by), number, sent({ entries }, version)));
  }
  const facts = await factsOf(of, number);
  for (const one of facts.documents.filter((each) => unseenState(each, facts).step === 'reveal')) {
    const { version } = (await fileOf(of, number)).row;
    value(await revealUnseen(of.ctx, of.who(by), number, sent({ document: one.document }, version)));
  }
}

/** Agrees every changed sheet as it stands. */
export async function agreed(of: Plant, number: string, by = TEAM.checker): Promise<void> {
  const facts = await factsOf(of, number);
  for (const one of facts.documents)
    for (const sheet of changedSheets(one)) {
      const { version } = (await fileOf(of, number)).row;
      const at = { number, document: one.document, sheet: sheet.key };
      value(await agreeSheet(of.ctx, of.who(by), at, sent({ hash: sheet.hash }, version)));
    }
}

/** Deficiencies for everything that failed before and has none: what an approver takes on with the signature. */
export async function deficiencies(of: Plant, number: string) {
  const facts = await factsOf(of, number);
  const owner = of.who(TEAM.originator).person.id;
  return facts.documents.flatMap((one) =>
    one.outcomes
      .filter((outcome) => outcome.inherited && outcome.severity !== 'note')
      .map((outcome) => ({
        outcome: outcome.hash,
        owner,
        due: addDays(today(of.ctx, of.site), 60),
        interim: 'The operating limit is held by procedure until then.',
      })),
  );
}

/** Changes on SYS-101 that reach its governing load and that the field can see. */
export const LARGER_IMPELLER: OpsBody['ops'] = [
  {
    op: 'set',
    path: 'sources/src_p101/pump/impeller',
    value: {
      value: 219,
      unit: 'mm',
      origin: { kind: 'test-record', ref: 'Pump curve P-101, 219 mm impeller' },
    },
  },
  {
    op: 'set',
    path: 'sources/src_p101/pump/shutoff',
    value: {
      value: 760,
      unit: 'kPa',
      origin: { kind: 'test-record', ref: 'Pump curve P-101, 219 mm impeller' },
    },
  },
  {
    op: 'set',
    path: 'sources/src_e101/heat/ua',
    value: { value: 114, unit: 'kW/K', origin: { kind: 'calculation', ref: 'Rating sheet RS-E101 rev 4' } },
  },
];

/** Another impeller alone, where a case on the same system comes later. */
export function impeller(diameter: number): OpsBody['ops'] {
  const shutoff = 720 + (diameter - 212) * 6;
  const origin = { kind: 'test-record', ref: `Pump curve P-101, ${String(diameter)} mm impeller` };
  return [
    { op: 'set', path: 'sources/src_p101/pump/impeller', value: { value: diameter, unit: 'mm', origin } },
    { op: 'set', path: 'sources/src_p101/pump/shutoff', value: { value: shutoff, unit: 'kPa', origin } },
  ];
}

/** A case on SYS-101 as far as its check: described, changed, analysed. */
export async function atCheck(
  of: Plant,
  team: Team = TEAM,
  ops: OpsBody['ops'] = LARGER_IMPELLER,
): Promise<string> {
  const number = await raised(of, ['SYS-101'], { team });
  await answered(of, number, team.originator);
  value(await act(of, number, 'PASS-draft', team.originator));
  await changed(of, number, 'SYS-101', ops, team.originator);
  value(await act(of, number, 'PASS-scenarios', team.originator));
  return number;
}

/** The same as far as its approval. */
export async function atApproval(
  of: Plant,
  team: Team = TEAM,
  ops: OpsBody['ops'] = LARGER_IMPELLER,
): Promise<string> {
  const number = await atCheck(of, team, ops);
  await checkedUnseen(of, number, team.checker);
  await agreed(of, number, team.checker);
  value(await act(of, number, 'PASS-check', team.checker));
  return number;
}

/** The same signed by all approvers: it waits in the field. */
export async function inField(
  of: Plant,
  team: Team = TEAM,
  ops: OpsBody['ops'] = LARGER_IMPELLER,
): Promise<string> {
  const number = await atApproval(of, team, ops);
  for (const name of team.approvers) value(await act(of, number, 'SIGN', name));
  return number;
}

/** Sees every line of the field sheet as it is signed, with a photograph where one is asked. */
export async function seen(of: Plant, number: string, by = TEAM.operations): Promise<void> {
  const file = await fileOf(of, number);
  const photograph = value(
    await keepPhotograph(
      of.ctx,
      of.who(by),
      { number, folder: of.folder },
      { name: 'plate.png', bytes: PICTURE },
    ),
  );
  const entries = file.lines.map((line, index) => ({
    client: `${number}-${String(index)}-${String(Date.now())}`,
    line: line.key,
    as: 'verifier' as const,
    seen: line.wants ?? 'A-1024',
    files: line.photo ? [photograph] : [],
    device: 'test',
  }));
  value(await enterField(of.ctx, of.who(by), number, sent({ entries })));
}

/** Does every due item that holds start-up, each by its owner. */
export async function startUpDone(of: Plant, number: string): Promise<void> {
  const file = await fileOf(of, number);
  for (const item of file.due.filter((one) => one.bars === 'start-up' && one.state === 'open')) {
    const owner = of.byId(item.ownerId);
    const body = { text: 'Done and filed.' };
    value(await turnDue(of.ctx, owner, { id: item.id, turn: 'do' }, sent(body, item.version)));
  }
}

/** The smallest picture that says by its first bytes that it is one. */
const PICTURE = Uint8Array.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
