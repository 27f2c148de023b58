/* The state of a change: what is typed with undo and draft, what it comes to 150 ms later, and its saving. */
import { useEffect, useMemo, useReducer, useState } from 'react';
import { type Op } from '@domain/basis';
import { clashesOf, settled, type Side } from './conflict';
import { type Draft, draftKeyOf, findDraft, keepDraft } from './draft';
import { fieldOf, type Read, type Typed } from './field';
import { historyOf, nextHistory, type Step } from './history';
import { saveOps, type Saved } from './save';
import { effectsOf, opsOf, type Plant, readAll, type TypedByPath } from './work';

/** Between the last keystroke and the recalculation, ms. */
const DEBOUNCE = 150;

type Source = { api: string; version: number; plant: Plant; paths: readonly string[] };
export type Sending = Saved | { kind: 'busy' } | undefined;

function useLater<T>(value: T): T {
  const [later, setLater] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => {
      setLater(value);
    }, DEBOUNCE);
    return () => {
      clearTimeout(timer);
    };
  }, [value]);
  return later;
}

/** Only the fields that say something new are kept, so that an undone change leaves no draft. */
function newOnes(typed: TypedByPath, reads: Readonly<Record<string, Read>>): TypedByPath {
  return Object.fromEntries(
    Object.entries(typed).filter(([path]) => reads[path] && reads[path].state !== 'same'),
  );
}

/** A draft of this address as it is found when the editor opens; one of an older version moves to this one. */
function openDraft({ api, version }: Source): Draft | undefined {
  const draft = findDraft(localStorage, api);
  if (draft && draft.version !== version) localStorage.removeItem(draftKeyOf(api, draft.version));
  return draft;
}

function useGuard(dirty: boolean): void {
  useEffect(() => {
    if (!dirty) return undefined;
    const ask = (event: BeforeUnloadEvent) => {
      event.preventDefault();
    };
    window.addEventListener('beforeunload', ask);
    return () => {
      window.removeEventListener('beforeunload', ask);
    };
  }, [dirty]);
}

function useTyped(source: Source) {
  const [draft] = useState(() => openDraft(source));
  const [history, step] = useReducer(nextHistory, draft?.typed, historyOf);
  const fields = useMemo(
    () => source.paths.flatMap((path) => fieldOf(source.plant.document, path) ?? []),
    [source.paths, source.plant],
  );
  const later = useLater(history.now);
  const reads = useMemo(() => readAll(fields, later, source.plant), [fields, later, source.plant]);
  const ops = useMemo(() => opsOf(reads, source.plant.document), [reads, source.plant]);
  const kept = useMemo(() => newOnes(later, reads), [later, reads]);
  useEffect(() => {
    keepDraft(localStorage, source.api, { version: source.version, typed: kept });
  }, [source, kept]);
  useGuard(Object.keys(kept).length > 0);
  return { draft, history, step, fields, reads, ops };
}

/** Everything the editor shows and does. */
export function useChange(source: Source, onSaved: (version: number, ops: readonly Op[]) => void) {
  const typed = useTyped(source);
  const [sending, setSending] = useState<Sending>();
  const work = useMemo(() => effectsOf(source.plant), [source.plant]);
  const effect = useMemo(() => work(typed.ops), [work, typed.ops]);
  const send = async (version: number, ops: readonly Op[]) => {
    setSending({ kind: 'busy' });
    const saved = await saveOps(source.api, version, ops);
    setSending(saved);
    if (saved.kind !== 'saved') return;
    keepDraft(localStorage, source.api, { version: source.version, typed: {} });
    onSaved(saved.version, ops);
  };
  const newer = sending?.kind === 'stale' ? sending.newer : undefined;
  const settle = (chosen: Record<string, Side>) => {
    if (!newer) return;
    const ops = settled(typed.ops, newer.document, chosen);
    if (ops.length === 0) onSaved(newer.version, []);
    else void send(newer.version, ops);
  };
  return {
    ...typed,
    effect,
    sending,
    clashes: newer ? clashesOf(typed.ops, newer.document) : undefined,
    settle,
    save: () => void send(source.version, typed.ops),
    type: (path: string, value: Typed) => {
      typed.step({ type: 'type', path, typed: value, at: Date.now() });
    },
  };
}

export type Change = ReturnType<typeof useChange>;
export type { Source, Step };
