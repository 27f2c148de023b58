/* A due item as a page shows it to one person: what is owed, by whom, by when, and what the reader may do with it. */
import { can, type Act, type On } from '@domain/case';
import { type DueRow } from '@data/due';
import { type Actor, whoOf } from '../context';
import { dayWords } from '../views/days';
import { DUE_ACTS, type DueAct } from './bodies';

export type DueItemView = {
  id: string;
  kind: string;
  text: string;
  owner: string;
  asked: string;
  due: string;
  late: boolean;
  state: DueRow['state'];
  stateWords: string;
  evidence: string;
  bars: DueRow['bars'];
  version: number;
  /** Acts that lead on from its state and are the reader's. */
  may: DueAct[];
};

const STATE_WORDS: Record<DueRow['state'], string> = {
  open: 'open',
  done: 'done',
  accepted: 'accepted',
  waived: 'waived',
};
const KIND_WORDS: Partial<Record<DueRow['kind'], string>> = {
  pssr: 'PSSR',
  'start-up': 'start-up action',
  'approval-requirement': 'approval requirement',
  'moved-result': 'moved result',
  'own-note': 'own note',
};
const FROM: Record<DueAct, DueRow['state']> = { do: 'open', waive: 'open', accept: 'done', reject: 'done' };
const ACT: Record<DueAct, Act> = {
  do: 'do-due',
  accept: 'accept-due',
  reject: 'reject-due',
  waive: 'waive-due',
};

/** The item for the reader; `on` tells owner, asker and the seats of its case. */
export function dueItemView(
  item: DueRow,
  of: { actor: Actor; on: On; today: string; nameOf: (id: string) => string },
): DueItemView {
  const may = DUE_ACTS.filter((act) => FROM[act] === item.state).filter(
    (act) => can(whoOf(of.actor), ACT[act], of.on).ok,
  );
  return {
    id: item.id,
    kind: KIND_WORDS[item.kind] ?? item.kind,
    text: item.text,
    owner: of.nameOf(item.ownerId),
    asked: of.nameOf(item.askedBy),
    due: dayWords(item.due),
    late: item.state === 'open' && item.due < of.today,
    state: item.state,
    stateWords: STATE_WORDS[item.state],
    evidence: item.evidence?.text ?? '',
    bars: item.bars,
    version: item.version,
    may,
  };
}
