/* Acts of a case that someone may do while there is nothing to do them on: a page need not offer them. */
import { type Act } from '@domain/case';
import { type OpenedCase } from './open';

/** Acts without an object: a reveal that has happened, an answer to no finding, a revision to carry over to that is not there. */
export function idleActs(of: OpenedCase): Act[] {
  const { file } = of;
  const states = file.findings.map((one) => one.state);
  const shown = file.documents.every((one) =>
    file.reveals.some((each) => each.documentId === one.document.id),
  );
  const overtaken = file.documents.some((one) => one.inForce && one.inForce.id !== one.base?.id);
  const idle: [Act, boolean][] = [
    ['unseen', shown],
    ['reveal', shown],
    ['reconcile', !shown],
    ['undo-agreement', file.agreements.length === 0],
    ['answer-finding', !states.includes('open')],
    ['close-finding', states.every((one) => one === 'closed')],
    ['reopen-finding', states.every((one) => one === 'open')],
    ['CARRY_OVER', !overtaken],
    ['answer-affected', file.affected.length === 0],
  ];
  return idle.filter(([, nothing]) => nothing).map(([act]) => act);
}
