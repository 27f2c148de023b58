/* Ways back and aside: returns void signatures from their gate on, holding and resuming, withdrawing, refusing; and what an act is refused for. */
import { beforeAll, describe, expect, test } from 'vitest';
import { addDays } from '@domain/dates';
import { today } from '@services/context';
import { act, codeOf, fileOf, plant, type Plant, pointsAt, value } from './plant';
import {
  agreed,
  answered,
  atApproval,
  atCheck,
  changed,
  checkedUnseen,
  impeller,
  inField,
  raised,
  seen,
  startUpDone,
  TEAM,
} from './hands';

let site: Plant;
beforeAll(async () => {
  site = await plant();
}, 120_000);

const reason = 'The rating sheet of the bundle is not the issued one.';

/** Gates whose signature stands, in order. */
async function standing(number: string): Promise<string[]> {
  const file = await fileOf(site, number);
  return file.signatures.filter((one) => one.voids.length === 0).map((one) => one.gate);
}

describe('a return', () => {
  test('of the originator, before the checker has entered anything, goes to the draft', async () => {
    const number = await atCheck(site);
    expect(value(await act(site, number, 'RETURN-own', 'Owen', { to: 'draft', reason })).stage).toBe('draft');
    expect(await standing(number)).toEqual([]);
    expect(value(await act(site, number, 'PASS-draft', 'Owen')).stage).toBe('scenarios');
  });

  test('of the originator is refused once an unseen entry stands', async () => {
    const number = await atCheck(site);
    await checkedUnseen(site, number);
    expect(codeOf(await act(site, number, 'RETURN-own', 'Owen', { to: 'scenarios', reason }))).toBe(
      'NOT_INDEPENDENT',
    );
    const back = await act(site, number, 'RETURN-check', 'Ilse', { to: 'scenarios', reason });
    expect(value(back).stage).toBe('scenarios');
    expect(await standing(number)).toEqual(['draft']);
  });

  test('of the approver goes to the check, and the check is signed again', async () => {
    const number = await atApproval(site);
    const back = await act(site, number, 'RETURN-approval', 'Grace', { to: 'check', reason });
    expect(value(back).stage).toBe('check');
    expect(await standing(number)).toEqual(['draft', 'scenarios']);
    expect(value(await act(site, number, 'PASS-check', 'Ilse')).stage).toBe('approval');
    expect(value(await act(site, number, 'SIGN', 'Grace')).stage).toBe('field');
  });

  test('leads only to an earlier stage', async () => {
    const number = await atApproval(site);
    const forth = await act(site, number, 'RETURN-approval', 'Grace', { to: 'field', reason });
    expect(codeOf(forth)).toBe('WRONG_STAGE');
  });
});

describe('aside', () => {
  const review = (of: Plant) => addDays(today(of.ctx, of.site), 30);

  test.each(['draft', 'scenarios', 'check', 'approval', 'field'] as const)(
    'holds in %s and resumes there, signatures standing',
    async (stage) => {
      const make = {
        draft: () => raised(site, ['SYS-101']),
        scenarios: async () => {
          const number = await raised(site, ['SYS-101']);
          await answered(site, number);
          value(await act(site, number, 'PASS-draft', 'Owen'));
          return number;
        },
        check: () => atCheck(site, TEAM, impeller(201)),
        approval: () => atApproval(site, TEAM, impeller(202)),
        field: () => inField(site, TEAM, impeller(203)),
      };
      const number = await make[stage]();
      const signed = await standing(number);
      expect(value(await act(site, number, 'HOLD', 'Owen', { reason, review: review(site) })).stage).toBe(
        'on-hold',
      );
      expect((await fileOf(site, number)).row.heldFrom).toBe(stage);
      expect(codeOf(await act(site, number, 'PASS-draft', 'Owen'))).toBe('WRONG_STAGE');
      expect(value(await act(site, number, 'RESUME', 'Grace')).stage).toBe(stage);
      expect(await standing(number)).toEqual(signed);
      expect((await fileOf(site, number)).row.heldFrom).toBeNull();
      expect(value(await act(site, number, 'WITHDRAW', 'Owen', { reason })).stage).toBe('withdrawn');
      const file = await fileOf(site, number);
      expect(file.documents.map((one) => one.row.state)).toEqual(['dropped']);
      expect(file.documents.every((one) => !one.working || one.working.state === 'dropped')).toBe(true);
      expect(file.row.closedAt).not.toBeNull();
    },
  );

  test('a refusal drops the revisions, and nothing leads on', async () => {
    const number = await atApproval(site, TEAM, impeller(204));
    expect(value(await act(site, number, 'REFUSE', 'Grace', { reason })).stage).toBe('refused');
    expect((await fileOf(site, number)).documents[0]?.working?.state).toBe('dropped');
    expect(codeOf(await act(site, number, 'SIGN', 'Grace'))).toBe('WRONG_STAGE');
  });
});

describe('an act is refused', () => {
  let number: string;
  beforeAll(async () => {
    number = await atApproval(site, TEAM, impeller(204));
  });

  /** What may never change by a refused act. */
  async function record(): Promise<unknown> {
    const { row, signatures, due } = await fileOf(site, number);
    const { seq } = (await site.db('trail_heads').where({ site_id: site.site.id }).first('seq')) as {
      seq: number;
    };
    const [mails] = (await site.db('notices').count('* as n')) as [{ n: number }];
    return {
      stage: row.stage,
      version: row.version,
      signatures: signatures.length,
      due: due.length,
      seq,
      mails,
    };
  }

  test.each([
    ['a wrong password', { password: 'not the word' }, 'PASSWORD_WRONG'],
    ['no password', { password: '' }, 'SCHEMA'],
    ['another page in view', { pageHash: 'a'.repeat(64) }, 'STALE'],
    ['an old version', { version: 1 }, 'STALE'],
  ])('for %s, and nothing is written', async (_what, given, code) => {
    const before = await record();
    expect(codeOf(await act(site, number, 'SIGN', 'Grace', given))).toBe(code);
    expect(await record()).toEqual(before);
  });

  test('for the originator, the checker and a stranger, whatever else they hold', async () => {
    const before = await record();
    expect(codeOf(await act(site, number, 'SIGN', 'Owen'))).toBe('NOT_PERMITTED');
    expect(codeOf(await act(site, number, 'SIGN', 'Ilse'))).toBe('NOT_PERMITTED');
    expect(codeOf(await act(site, number, 'SIGN', 'Rufus'))).toBe('NOT_PERMITTED');
    expect(codeOf(await act(site, number, 'SIGN', 'Aoife'))).toBe('NOT_PERMITTED');
    expect(await record()).toEqual(before);
  });

  test('the second time with the same key: the first answer again, nothing written twice', async () => {
    const key = 'one-key-for-one-act';
    const first = await act(site, number, 'SIGN', 'Grace', { key });
    const after = await record();
    const version = (await fileOf(site, number)).row.version - 1;
    const again = await act(site, number, 'SIGN', 'Grace', { key, version });
    expect(value(again)).toEqual(value(first));
    expect(await record()).toEqual(after);
    expect(codeOf(await act(site, number, 'WITHDRAW', 'Grace', { key, reason }))).toBe('KEY_REUSED');
  });
});

describe('a return from the field', () => {
  test('drops what was approved and works on a copy of it; what was seen counts anew only if it agrees', async () => {
    const number = await inField(site, TEAM, impeller(221));
    await seen(site, number);
    await startUpDone(site, number);
    const approved = (await fileOf(site, number)).documents[0]?.working?.id ?? '';
    const back = await act(site, number, 'RETURN-field', 'Tomas', { to: 'scenarios', reason });
    expect(value(back).stage).toBe('scenarios');
    const file = await fileOf(site, number);
    expect(file.documents[0]?.working).toMatchObject({ state: 'working' });
    expect(file.documents[0]?.working?.id).not.toBe(approved);
    expect(await site.db('revisions').where({ id: approved }).first('state')).toEqual({ state: 'dropped' });
    expect(await site.db('p_systems').where({ tag: 'SYS-101', case_id: file.row.id })).toEqual([]);
    await changed(site, number, 'SYS-101', impeller(224));
    value(await act(site, number, 'PASS-scenarios', 'Owen'));
    await checkedUnseen(site, number);
    await agreed(site, number);
    value(await act(site, number, 'PASS-check', 'Ilse'));
    value(await act(site, number, 'SIGN', 'Grace'));
    const open = await pointsAt(site, number, 'field');
    expect(open.some((point) => point.includes('is not what is signed now'))).toBe(true);
    expect(open.filter((point) => point.startsWith('start-up-action-open')).length).toBeGreaterThan(1);
    await seen(site, number);
    await startUpDone(site, number);
    const done = await act(site, number, 'ISSUE', 'Tomas', { document: 'SYS-101' });
    expect(value(done).stage).toBe('in-force');
  });
});
