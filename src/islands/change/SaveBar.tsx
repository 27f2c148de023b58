/* Saving, undo and redo, and what the last attempt to save came to. */
import { Clashes } from './Clashes';
import { type Change, type Sending } from './use-change';

function sentenceOf(sending: Sending): string | undefined {
  switch (sending?.kind) {
    case 'busy':
      return 'Saving.';
    case 'signed-out':
      return 'Not saved: you are signed out. Sign in again in another tab, then save; everything typed is still here.';
    case 'unreached':
      return 'Not saved: the server does not answer. Everything typed is kept in this browser; save again in a moment.';
    case 'refused':
      return `Not saved. ${sending.detail}`;
    default:
      return undefined;
  }
}

/** What keeps the change from being saved, when the button is pressed too early. */
function missing(change: Change): string | undefined {
  const wrong = change.fields.filter(({ path }) => change.reads[path]?.state === 'wrong');
  if (wrong.length > 0) return `Put right first: ${wrong.map(({ label }) => label).join('; ')}.`;
  return change.ops.length === 0 ? 'Nothing was changed yet.' : undefined;
}

type Props = { change: Change; early: boolean; onEarly: (early: boolean) => void };

/** The bar below the fields. */
export function SaveBar({ change, early, onEarly }: Props) {
  const lack = missing(change);
  const told = early && lack ? lack : sentenceOf(change.sending);
  const stopped = (early && lack) || !['busy', 'saved', undefined].includes(change.sending?.kind);
  const { history, step } = change;
  return (
    <>
      {change.clashes && <Clashes clashes={change.clashes} onSettle={change.settle} />}
      <div className="acts pad">
        <button
          type="button"
          className={change.clashes ? 'btn' : 'btn main'}
          aria-busy={change.sending?.kind === 'busy' || undefined}
          onClick={() => {
            onEarly(lack !== undefined);
            if (lack === undefined && change.sending?.kind !== 'busy') change.save();
          }}
        >
          Save the change
        </button>
        {history.past.length > 0 && (
          <button
            type="button"
            className="btn"
            aria-keyshortcuts="Control+Z"
            onClick={() => {
              step({ type: 'undo' });
            }}
          >
            Undo
          </button>
        )}
        {history.future.length > 0 && (
          <button
            type="button"
            className="btn"
            aria-keyshortcuts="Control+Shift+Z"
            onClick={() => {
              step({ type: 'redo' });
            }}
          >
            Redo
          </button>
        )}
        {change.sending?.kind === 'signed-out' && (
          <a href="/sign-in" target="_blank" rel="noreferrer">
            Sign in
          </a>
        )}
      </div>
      <p className={stopped && told ? 'err' : 'note'} role="status">
        {told}
      </p>
    </>
  );
}
