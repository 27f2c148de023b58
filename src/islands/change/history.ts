/* Undo and redo of what was typed; a run of keystrokes in one field is one step. */
import { type Typed } from './field';
import { type TypedByPath } from './work';

export type History = {
  past: readonly TypedByPath[];
  now: TypedByPath;
  future: readonly TypedByPath[];
  /** The field of the running step and when it was last typed in, ms. */
  run?: { path: string; at: number };
};
export type Step =
  | { type: 'type'; path: string; typed: Typed; at: number }
  | { type: 'take'; now: TypedByPath }
  | { type: 'undo' }
  | { type: 'redo' };

/** A pause longer than this begins a new step, ms. */
const PAUSE = 1000;
const MOST_STEPS = 200;

/** A history with nothing to undo. */
export function historyOf(now: TypedByPath = {}): History {
  return { past: [], now, future: [] };
}

/** The history after a step; undo without past and redo without future change nothing. */
export function nextHistory(history: History, step: Step): History {
  const { past, now, future, run } = history;
  if (step.type === 'take') return historyOf(step.now);
  if (step.type === 'undo') {
    const back = past.at(-1);
    return back ? { past: past.slice(0, -1), now: back, future: [now, ...future] } : history;
  }
  if (step.type === 'redo') {
    const [ahead, ...rest] = future;
    return ahead ? { past: [...past, now], now: ahead, future: rest } : history;
  }
  const goesOn = run?.path === step.path && step.at - run.at < PAUSE;
  return {
    past: goesOn ? past : [...past, now].slice(-MOST_STEPS),
    now: { ...now, [step.path]: step.typed },
    future: [],
    run: { path: step.path, at: step.at },
  };
}
