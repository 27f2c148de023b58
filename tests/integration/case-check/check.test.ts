/* The check as it is worked: order of the unseen entries, figures as typed, agreements at a hash, findings by who may. */
import { beforeAll, describe, expect, test } from 'vitest';
import { richFromText } from '@domain/text';
import { agreeSheet, undoAgreement } from '@services/check/agree';
import { raiseFinding, turnFinding } from '@services/check/findings';
import { revealUnseen } from '@services/check/unseen';
import { enterTypedUnseen, type UnseenBody } from '@services/check/unseen-typed';
import { findingsView } from '@services/views/case/findings';
import { unseenView } from '@services/views/case/unseen';
import { HIDDEN_CASE, OPEN_CASE, opened, type Place, seededPlace, written } from './support';

const CHECKER = 'Ilse Fennimore';
let place: Place;
beforeAll(async () => {
  place = await seededPlace();
}, 120_000);

async function systemOf(number: string) {
  const { of } = await opened(place, await place.as(CHECKER), number);
  const system = (await unseenView(of)).systems[0];
  if (!system) throw new Error('The case has no system.');
  return system;
}

async function enter(entries: UnseenBody['entries'], as = CHECKER) {
  return enterTypedUnseen(
    place.ctx,
    await place.as(as),
    HIDDEN_CASE,
    await written(place, HIDDEN_CASE, { entries }),
  );
}

type Item = Awaited<ReturnType<typeof systemOf>>['items'][number];
const typedFor = (document: string, item: Item, at: number): UnseenBody['entries'][number] =>
  item.ask.kind === 'word'
    ? { document, scope: item.scope, word: item.ask.options[0]?.value ?? '' }
    : { document, scope: item.scope, typed: String(100 + at), unit: item.ask.unit, cites: '301-P-006 rev 7' };

describe('the unseen check', () => {
  test('asks readings and choices first; a figure out of order is refused', async () => {
    const system = await systemOf(HIDDEN_CASE);
    expect(system.step).toBe('reading');
    expect(new Set(system.items.filter((item) => item.asked).map((item) => item.layer))).toEqual(
      new Set(['reading', 'choice']),
    );
    const scope = 'sheets/size:gas-blow-by/ans_g1#A_required';
    const result = await enter([{ document: system.document, scope, value: { value: 1000, unit: 'mm2' } }]);
    expect(result).toMatchObject({ ok: false, problem: { code: 'SCHEMA' } });
  });

  test('a bare psi is ambiguous, and told beside its field', async () => {
    const system = await systemOf(HIDDEN_CASE);
    const set = system.items.find((item) => item.scope.endsWith('/set'));
    const result = await enter([{ document: system.document, scope: set?.scope ?? '', typed: '150 psi' }]);
    expect(result).toMatchObject({
      ok: false,
      problem: { code: 'UNIT_AMBIGUOUS', errors: [{ path: 'entries/0/typed' }] },
    });
  });

  test('a unit that measures something else is refused beside its field', async () => {
    const system = await systemOf(HIDDEN_CASE);
    const set = system.items.find((item) => item.scope.endsWith('/set'));
    const result = await enter([{ document: system.document, scope: set?.scope ?? '', typed: '12 kg/h' }]);
    expect(result).toMatchObject({
      ok: false,
      problem: { code: 'SCHEMA', errors: [{ path: 'entries/0/typed' }] },
    });
  });

  test('nothing filled in is told, nothing is written', async () => {
    const system = await systemOf(HIDDEN_CASE);
    const scope = system.items[0]?.scope ?? '';
    expect(await enter([{ document: system.document, scope }])).toMatchObject({
      ok: false,
      problem: { code: 'SCHEMA' },
    });
    expect((await systemOf(HIDDEN_CASE)).left).toBe(system.left);
  });

  test('is entered by the checker alone', async () => {
    const system = await systemOf(HIDDEN_CASE);
    const entry = { document: system.document, scope: system.items[0]?.scope ?? '', typed: '100' };
    for (const name of ['Pavel Dostrun', 'Grace Okonta', 'Hedda Brannick'])
      expect(await enter([entry], name)).toMatchObject({ ok: false, problem: { code: 'NOT_PERMITTED' } });
  });

  test('goes on to the figures, then to the reveal, then shows both sides', async () => {
    for (let round = 0; round < 6; round++) {
      const system = await systemOf(HIDDEN_CASE);
      if (system.step === 'reveal') break;
      expect(system.rows).toEqual([]);
      const asked = system.items.filter((item) => item.asked);
      const result = await enter(asked.map((item, at) => typedFor(system.document, item, at)));
      expect(result.ok ? '' : result.problem.detail).toBe('');
    }
    const ready = await systemOf(HIDDEN_CASE);
    expect(ready.step).toBe('reveal');
    const actor = await place.as(CHECKER);
    const body = { document: ready.document };
    const result = await revealUnseen(place.ctx, actor, HIDDEN_CASE, await written(place, HIDDEN_CASE, body));
    expect(result.ok).toBe(true);
    const shown = await systemOf(HIDDEN_CASE);
    expect(shown.step).toBe('done');
    expect(shown.rows.length).toBe(shown.items.length);
    expect(shown.rows.some((row) => !row.within)).toBe(true);
  });

  test('is the checker’s alone until the reveal: others only see that something is entered', async () => {
    const other = await seededPlace();
    const system = await systemOf(HIDDEN_CASE);
    const reading = system.items.find((item) => item.layer === 'reading' && item.ask.kind === 'quantity');
    const entries = [
      { document: system.document, scope: reading?.scope ?? '', typed: '98765', cites: 'plate' },
    ];
    const sent = await written(other, HIDDEN_CASE, { entries });
    expect((await enterTypedUnseen(other.ctx, await other.as(CHECKER), HIDDEN_CASE, sent)).ok).toBe(true);
    const { of } = await opened(other, await other.as('Pavel Dostrun'), HIDDEN_CASE);
    expect(JSON.stringify(await unseenView(of))).not.toMatch(/98.?765/);
  }, 60_000);
});

describe('agreements', () => {
  test('a stale hash is refused as differing; the present one is agreed, and undone', async () => {
    const actor = await place.as(CHECKER);
    const { of } = await opened(place, actor, OPEN_CASE);
    const one = of.file.documents[0];
    const sheet = Object.values(one?.after?.evaluation.sheets ?? {})[0];
    const at = { number: OPEN_CASE, document: one?.document.id ?? '', sheet: sheet?.key ?? '' };
    const send = async (hash: string) =>
      agreeSheet(place.ctx, actor, at, await written(place, OPEN_CASE, { hash }));
    expect(await send('0'.repeat(64))).toMatchObject({ ok: false, problem: { code: 'DIFFERS' } });
    expect(await send(sheet?.hash ?? '')).toMatchObject({ ok: true, value: { agreed: true } });
    const undone = await undoAgreement(place.ctx, actor, at, await written(place, OPEN_CASE, {}));
    expect(undone).toMatchObject({ ok: true, value: { agreed: false } });
  });

  test('an older version of the case is told as stale', async () => {
    const actor = await place.as(CHECKER);
    const at = { number: OPEN_CASE, document: 'SYS-102', sheet: 'x' };
    const sent = await written(place, OPEN_CASE, { hash: '0'.repeat(64) }, 0);
    expect(await agreeSheet(place.ctx, actor, at, sent)).toMatchObject({
      ok: false,
      problem: { code: 'STALE' },
    });
  });
});

describe('findings', () => {
  const body = {
    place: 'brief/effect',
    weight: 'should-fix' as const,
    text: richFromText('The effect is not said.'),
  };

  test('are raised by the checker, not by the originator', async () => {
    const refused = await raiseFinding(
      place.ctx,
      await place.as('Owen Tarrant'),
      OPEN_CASE,
      await written(place, OPEN_CASE, body),
    );
    expect(refused).toMatchObject({ ok: false, problem: { code: 'NOT_PERMITTED' } });
    const made = await raiseFinding(
      place.ctx,
      await place.as(CHECKER),
      OPEN_CASE,
      await written(place, OPEN_CASE, body),
    );
    expect(made.ok).toBe(true);
  });

  test('are answered by the originator and closed by who raised them alone', async () => {
    const { of } = await opened(place, await place.as(CHECKER), OPEN_CASE);
    const finding = findingsView(of).findings.find((one) => one.state === 'open')?.number ?? 0;
    const turn = async (name: string, word: 'answer-finding' | 'close-finding' | 'reopen-finding') =>
      turnFinding(
        place.ctx,
        await place.as(name),
        { number: OPEN_CASE, finding, turn: word },
        await written(place, OPEN_CASE, { text: richFromText('It is said now, in the second paragraph.') }),
      );
    expect(await turn(CHECKER, 'answer-finding')).toMatchObject({
      ok: false,
      problem: { code: 'NOT_PERMITTED' },
    });
    expect((await turn('Owen Tarrant', 'answer-finding')).ok).toBe(true);
    expect(await turn('Grace Okonta', 'close-finding')).toMatchObject({
      ok: false,
      problem: { code: 'NOT_INDEPENDENT' },
    });
    expect((await turn(CHECKER, 'close-finding')).ok).toBe(true);
    expect((await turn(CHECKER, 'reopen-finding')).ok).toBe(true);
  });
});
