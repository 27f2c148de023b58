/* The acts that move a case from stage to stage, and what one of them carries while it is written. */
import { type Act, type GateFacts, type Stage } from '@domain/case';
import { type Db } from '@data/connection';
import { type CaseFile } from '../case-file';
import { type Actor, type Ctx } from '../context';

/** The acts of the stage table that can be asked for here. */
export const STAGE_ACTS = [
  'PASS-draft',
  'PASS-draft-graded',
  'PASS-scenarios',
  'PASS-check',
  'SIGN',
  'REFUSE',
  'RETURN-own',
  'RETURN-check',
  'RETURN-approval',
  'RETURN-field',
  'HOLD',
  'RESUME',
  'WITHDRAW',
  'ISSUE',
  'DROP',
  'CARRY_OVER',
] as const satisfies readonly Act[];
export type StageAct = (typeof STAGE_ACTS)[number];

/** True for the name of an act that moves a case. */
export function isStageAct(name: string): name is StageAct {
  return (STAGE_ACTS as readonly string[]).includes(name);
}

/** What an act may carry; which fields count depends on the act. */
export type StageBody = {
  password?: string;
  /** Hash of what was in view when the person signed. */
  pageHash?: string;
  reason?: string;
  to?: Stage;
  review?: string;
  /** Id or tag of the system that is issued, dropped or carried over. */
  document?: string;
  /** What an approver asks for with the signature. */
  requirements?: { text: string; owner: string; due: string; bars?: 'start-up' | 'extension' }[];
  /** Inherited failures that an approver takes on with the signature; `outcome` is the hash of the outcome. */
  deficiencies?: { outcome: string; owner: string; due: string; interim: string }[];
};

/** An act while it is written: inside the transaction, with everything that was read before it. */
export type StageWrite = {
  trx: Db;
  ctx: Ctx;
  actor: Actor;
  file: CaseFile;
  facts: GateFacts;
  act: StageAct;
  body: StageBody;
  at: string;
  today: string;
  /** Stage that the machine has reached with this act. */
  reached: Stage;
  /** The signature of the act, once it is written. */
  signature?: string;
};
