/* The pure parts of the editor of a change: reading what is typed, its effect, undo, drafts, saving and stale saves. */
import { describe, expect, it } from 'vitest';
import { applyOps, type Basis, isKnown, type Op } from '@domain/basis';
import { NO_IMPORTS } from '@domain/evaluate';
import { clashesOf, settled } from '@islands/change/conflict';
import { draftKeyOf, findDraft, keepDraft } from '@islands/change/draft';
import { type Field, fieldOf, readField } from '@islands/change/field';
import { historyOf, nextHistory } from '@islands/change/history';
import { saveOps } from '@islands/change/save';
import { effectsOf, opsOf, type Plant, readAll } from '@islands/change/work';
import { RULES, smallBasis } from '../../fixtures/basis';

const SET = 'reliefPoints/rp_1/set';
const AREA = 'reliefPoints/rp_1/orifice/effective';
const doc: Basis = smallBasis();
const plant: Plant = { document: doc, base: doc, judgement: RULES, imports: NO_IMPORTS };

function field(path: string): Field {
  const found = fieldOf(doc, path);
  if (!found) throw new Error(`${path} cannot be edited`);
  return found;
}
const read = (path: string, text: string) =>
  readField(field(path), { ...field(path).start, text }, doc, RULES);
const set = (path: string, value: number, unit: string): Op => ({
  op: 'set',
  path,
  value: { value, unit },
  was: getValue(path),
});
function getValue(path: string): unknown {
  return path.split('/').reduce<unknown>((at, part) => {
    if (Array.isArray(at)) return at.find((one: { id?: string }) => one.id === part);
    return (at as Record<string, unknown>)[part];
  }, doc);
}

describe('a typed figure', () => {
  it('takes a bare number in the unit that stands there, and keeps its origin', () => {
    const got = read(SET, '3.4');
    expect(got).toMatchObject({
      state: 'right',
      figure: { value: 3.4, unit: 'bar_g', origin: { kind: 'data-sheet' } },
    });
  });

  it('asks gauge or absolute for a bare bar', () => {
    expect(read(SET, '3.4 bar')).toMatchObject({
      state: 'wrong',
      sentence: expect.stringContaining('gauge or absolute') as string,
    });
  });

  it('takes another unit as typed', () => {
    expect(read(SET, '50 psig')).toMatchObject({ state: 'right', figure: { value: 50, unit: 'psig' } });
  });

  it('keeps printed digits that say more than the number', () => {
    expect(read(SET, '3.40')).toMatchObject({ figure: { value: 3.4, text: '3.40' } });
  });

  it('refuses what is impossible beside its field and warns of what is unusual', () => {
    expect(read(AREA, '-5')).toMatchObject({
      state: 'wrong',
      sentence: expect.stringContaining('impossible') as string,
    });
    const unusual = read(SET, '600');
    expect(unusual).toMatchObject({ state: 'right', warning: expect.stringContaining('unusual') as string });
  });

  it('is nothing new while it says what stands there', () => {
    expect(read(SET, '3.5')).toEqual({ state: 'same' });
  });

  it('gets a new origin when one is stated', () => {
    const typed = { text: '3.4', kind: 'plate' as const, ref: ' Plate of PSV-1 ' };
    const got = readField(field(SET), typed, doc, RULES);
    expect(got).toMatchObject({ figure: { origin: { kind: 'plate', ref: 'Plate of PSV-1' } } });
  });

  it('is not offered where no figure stands', () => {
    expect(fieldOf(doc, 'reliefPoints/rp_1/duty')).toBeUndefined();
  });
});

describe('the effect', () => {
  const work = effectsOf(plant);

  it('is none without a change', () => {
    const effect = work([]);
    if (typeof effect === 'string') throw new Error(effect);
    expect(effect.groups.length).toBeGreaterThan(0);
    expect(effect.groups[0]?.use).toBe(effect.groups[0]?.useBefore);
    expect([effect.fresh, effect.cleared]).toEqual([[], []]);
  });

  it('shows half the area as twice the use, with a new outcome and another verdict', () => {
    const reads = readAll([field(AREA)], { [AREA]: { ...field(AREA).start, text: '920.5' } }, plant);
    const effect = work(opsOf(reads, doc));
    if (typeof effect === 'string') throw new Error(effect);
    const [group] = effect.groups;
    expect((group?.use ?? 0) / (group?.useBefore ?? 1)).toBeCloseTo(2, 1);
    expect(group?.verdict).toBe('inadequate');
    expect(group?.before).not.toBe('inadequate');
    expect(effect.fresh.length).toBeGreaterThan(0);
  });

  it('saves only what is right, with what stood there', () => {
    const typed = {
      [SET]: { ...field(SET).start, text: '3.4' },
      [AREA]: { ...field(AREA).start, text: 'much' },
    };
    const ops = opsOf(readAll([field(SET), field(AREA)], typed, plant), doc);
    expect(ops.map(({ path }) => path)).toEqual([SET]);
    expect(ops[0]?.was).toEqual(getValue(SET));
  });
});

describe('undo', () => {
  const typed = (text: string) => ({ text, kind: '' as const, ref: '' });
  const type = (path: string, text: string, at: number) => ({
    type: 'type' as const,
    path,
    typed: typed(text),
    at,
  });

  it('takes a run of keystrokes as one step, and redo brings it back', () => {
    let history = historyOf();
    for (const [text, at] of [
      ['3', 0],
      ['3.', 100],
      ['3.4', 200],
    ] as const)
      history = nextHistory(history, type(SET, text, at));
    history = nextHistory(history, type(SET, '3.45', 5000));
    expect(history.past).toHaveLength(2);
    history = nextHistory(history, { type: 'undo' });
    expect(history.now[SET]?.text).toBe('3.4');
    history = nextHistory(nextHistory(history, { type: 'undo' }), { type: 'undo' });
    expect(history.now).toEqual({});
    history = nextHistory(history, { type: 'redo' });
    expect(history.now[SET]?.text).toBe('3.4');
  });

  it('begins a new step in another field', () => {
    const history = nextHistory(nextHistory(historyOf(), type(SET, '3', 0)), type(AREA, '9', 10));
    expect(history.past).toHaveLength(2);
  });
});

describe('a draft', () => {
  function store(): Storage {
    const held = new Map<string, string>();
    return {
      get length() {
        return held.size;
      },
      clear: () => {
        held.clear();
      },
      key: (index) => [...held.keys()][index] ?? null,
      getItem: (key) => held.get(key) ?? null,
      setItem: (key, value) => held.set(key, value),
      removeItem: (key) => held.delete(key),
    };
  }
  const typed = { [SET]: { text: '3.4 ba', kind: '' as const, ref: '' } };

  it('is found again with its version, right or wrong as typed', () => {
    const kept = store();
    keepDraft(kept, '/a', { version: 3, typed });
    expect(findDraft(kept, '/a')).toEqual({ version: 3, typed });
    expect(findDraft(kept, '/b')).toBeUndefined();
  });

  it('goes when nothing is typed any more, and a broken one is none', () => {
    const kept = store();
    keepDraft(kept, '/a', { version: 3, typed });
    keepDraft(kept, '/a', { version: 3, typed: {} });
    expect(kept).toHaveLength(0);
    kept.setItem(draftKeyOf('/a', 4), '{"x":1}');
    expect(findDraft(kept, '/a')).toBeUndefined();
  });
});

describe('saving', () => {
  const ops = [set(SET, 3.4, 'bar_g')];
  const answers = (...list: [number, unknown][]) => {
    const asked: Request[] = [];
    const ask = ((url: string, init: RequestInit) => {
      asked.push(new Request(`http://x${url}`, init));
      const [status, body] = list.shift() ?? [500, {}];
      return Promise.resolve(new Response(JSON.stringify(body), { status }));
    }) as typeof fetch;
    return { ask, asked };
  };

  it('sends the ops on their version and takes the new one', async () => {
    const { ask, asked } = answers([200, { version: 8 }]);
    expect(await saveOps('/d', 7, ops, ask)).toEqual({ kind: 'saved', version: 8 });
    expect([asked[0]?.method, asked[0]?.headers.get('if-match')]).toEqual(['PATCH', '"revision-7"']);
  });

  it('reads the newer version when it is stale', async () => {
    const { ask } = answers([412, {}], [200, { version: 9, document: doc }]);
    expect(await saveOps('/d', 7, ops, ask)).toMatchObject({ kind: 'stale', newer: { version: 9 } });
  });

  it('tells signed out, refused and unreached apart', async () => {
    expect((await saveOps('/d', 7, ops, answers([401, {}]).ask)).kind).toBe('signed-out');
    const errors = [{ path: SET, code: 'VALUE_IMPOSSIBLE', sentence: 'No.' }];
    const refused = await saveOps('/d', 7, ops, answers([422, { detail: 'No.', errors }]).ask);
    expect(refused).toEqual({ kind: 'refused', detail: 'No.', errors });
    const gone = (() => Promise.reject(new TypeError('gone'))) as typeof fetch;
    expect((await saveOps('/d', 7, ops, gone)).kind).toBe('unreached');
  });
});

describe('a stale save', () => {
  const ops = [set(SET, 3.4, 'bar_g'), set(AREA, 1900, 'mm2')];
  const moved = applyOps(doc, [set(SET, 3.3, 'bar_g')]);
  const theirs = moved.ok ? moved.value : doc;

  it('asks only for figures that both sides changed', () => {
    expect(clashesOf(ops, theirs).map(({ path, ours, theirs: other }) => [path, ours, other])).toEqual([
      [SET, '3.4 barg', '3.3 barg'],
    ]);
  });

  it('sends ours or leaves theirs as chosen, on what stands now', () => {
    const ours = settled(ops, theirs, { [SET]: 'ours' });
    expect(ours.map(({ path }) => path)).toEqual([SET, AREA]);
    const applied = applyOps(theirs, ours);
    const value = applied.ok ? applied.value.reliefPoints[0]?.set : undefined;
    expect(value && isKnown(value) ? value.value : undefined).toBe(3.4);
    expect(settled(ops, theirs, { [SET]: 'theirs' }).map(({ path }) => path)).toEqual([AREA]);
  });
});
