/* One figure to edit: label, present value, the figure with its unit, where it is from, and what is wrong or unusual with it. */
import { useId, useState } from 'react';
import { unitLabel } from '@engine/quantity';
import { type Field, type Read, type Typed } from './field';
import { ORIGINS } from './origins';

type Props = {
  field: Field;
  typed: Typed;
  read: Read;
  /** What the server refused here. */
  refused: string | undefined;
  onType: (typed: Typed) => void;
};

function OriginOf({ id, typed, onType }: { id: string; typed: Typed; onType: (typed: Typed) => void }) {
  return (
    <div className="change-origin">
      <label htmlFor={`${id}-kind`}>From</label>
      <select
        id={`${id}-kind`}
        className="in small"
        value={typed.kind}
        onChange={({ target }) => {
          onType({ ...typed, kind: ORIGINS.find(({ kind }) => kind === target.value)?.kind ?? '' });
        }}
      >
        <option value="">Not stated</option>
        {ORIGINS.map(({ kind, words }) => (
          <option key={kind} value={kind}>
            {words}
          </option>
        ))}
      </select>
      <label htmlFor={`${id}-ref`} className="vh">
        Document and place
      </label>
      <input
        id={`${id}-ref`}
        className="in small"
        placeholder="Document, revision, page"
        maxLength={400}
        value={typed.ref}
        onChange={({ target }) => {
          onType({ ...typed, ref: target.value });
        }}
      />
    </div>
  );
}

function Quantity({
  id,
  field,
  typed,
  wrong,
  described,
  onType,
}: {
  id: string;
  field: Field;
  typed: Typed;
  wrong: boolean;
  described: string;
  onType: (typed: Typed) => void;
}) {
  return (
    <div className={field.path.endsWith('/set') ? 'qty set' : 'qty'}>
      <input
        id={id}
        type="text"
        inputMode="decimal"
        autoComplete="off"
        value={typed.text}
        aria-invalid={wrong || undefined}
        aria-describedby={described}
        onChange={({ target }) => {
          onType({ ...typed, text: target.value });
        }}
      />
      <span className="unit">{unitLabel(field.unit)}</span>
    </div>
  );
}

/** A figure in its frame; typed text stays, whatever is said of it. */
export function FigureField({ field, typed, read, refused, onType }: Props) {
  const id = useId();
  const [asked, setAsked] = useState(false);
  const wrong = read.state === 'wrong' ? read.sentence : refused;
  const warning = read.state === 'right' ? read.warning : undefined;
  const described = [`${id}-now`, wrong && `${id}-error`, warning && `${id}-warning`]
    .filter(Boolean)
    .join(' ');
  return (
    <div className={wrong ? 'field change-field bad' : 'field change-field'}>
      <label htmlFor={id}>{field.label}</label>
      <span className="hint" id={`${id}-now`}>
        Now {field.present}
        {field.start.ref && `, from ${field.start.ref}`}
      </span>
      <Quantity {...{ id, field, typed, wrong: Boolean(wrong), described, onType }} />
      {wrong && (
        <p className="err" id={`${id}-error`}>
          {wrong}
        </p>
      )}
      {warning && (
        <p className="hint" id={`${id}-warning`}>
          <b>Unusual.</b> {warning}
        </p>
      )}
      {asked || read.state !== 'same' ? (
        <OriginOf id={id} typed={typed} onType={onType} />
      ) : (
        <button
          type="button"
          className="link change-ask"
          aria-label={`Change the origin of ${field.label}`}
          onClick={() => {
            setAsked(true);
          }}
        >
          Origin
        </button>
      )}
    </div>
  );
}
