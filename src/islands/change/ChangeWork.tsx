/* The editor of a change at work: fields on the left, their effect on the right, recalculated as one types. */
import { type KeyboardEvent, useState } from 'react';
import { type Op } from '@domain/basis';
import { Effects, percentOf } from './Effects';
import { type Field } from './field';
import { FigureField } from './FigureField';
import { SaveBar } from './SaveBar';
import { type Change, type Source, useChange } from './use-change';
import { type Effect } from './work';

export type PathSection = { title: string; paths: readonly string[] };
type Props = {
  source: Source;
  sections: readonly PathSection[];
  onSaved: (version: number, ops: readonly Op[]) => void;
};

function keyStep({ key, ctrlKey, metaKey, shiftKey }: KeyboardEvent): 'undo' | 'redo' | undefined {
  if (!ctrlKey && !metaKey) return undefined;
  if (key.toLowerCase() === 'y') return 'redo';
  if (key.toLowerCase() !== 'z') return undefined;
  return shiftKey ? 'redo' : 'undo';
}

/** The effect in one sentence, for those who hear the page. */
function said(effect: Effect | string, changed: boolean): string {
  if (typeof effect === 'string' || !changed) return '';
  const groups = effect.groups.map(
    ({ name, use, verdict }) => `${name}: ${percentOf(use)} used, ${verdict.replace('-', ' ')}`,
  );
  return `${groups.join('; ')}. ${String(effect.fresh.length)} new outcomes, ${String(effect.cleared.length)} cleared.`;
}

function FieldOf({ field, change }: { field: Field; change: Change }) {
  const { sending, history, reads } = change;
  const refused =
    sending?.kind === 'refused' ? sending.errors.find(({ path }) => path === field.path) : undefined;
  return (
    <FigureField
      field={field}
      typed={history.now[field.path] ?? field.start}
      read={reads[field.path] ?? { state: 'same' }}
      refused={refused?.sentence}
      onType={(typed) => {
        change.type(field.path, typed);
      }}
    />
  );
}

function Sections({ sections, change }: { sections: readonly PathSection[]; change: Change }) {
  return sections.map(({ title, paths }) => {
    const fields = change.fields.filter(({ path }) => paths.includes(path));
    if (fields.length === 0) return null;
    return (
      <fieldset key={title} className="change-section">
        <legend>{title}</legend>
        <div className="row-fields">
          {fields.map((field) => (
            <FieldOf key={field.path} field={field} change={change} />
          ))}
        </div>
      </fieldset>
    );
  });
}

function Restored({ change, version }: { change: Change; version: number }) {
  if (!change.draft) return null;
  const older = change.draft.version !== version;
  return (
    <p className="note">
      What you had typed here before is back; it is not saved yet.
      {older && ' The relief basis was changed since: look at each figure again.'}
    </p>
  );
}

/** Fields, effect and save bar. */
export function ChangeWork({ source, sections, onSaved }: Props) {
  const change = useChange(source, onSaved);
  const [early, setEarly] = useState(false);
  const onKeyDown = (event: KeyboardEvent) => {
    const step = keyStep(event);
    if (!step) return;
    event.preventDefault();
    change.step({ type: step });
  };
  return (
    <div className="change" onKeyDown={onKeyDown}>
      <div>
        <Restored change={change} version={source.version} />
        <Sections sections={sections} change={change} />
        <SaveBar change={change} early={early} onEarly={setEarly} />
      </div>
      <div role="region" aria-label="Effect of what is typed">
        <h3>Effect</h3>
        <Effects effect={change.effect} />
        <p className="vh" role="status">
          {said(change.effect, change.ops.length > 0)}
        </p>
      </div>
    </div>
  );
}
