/* A stale save: both sides of every figure that somebody else changed too, and the choice between them. */
import { useState } from 'react';
import { type Clash, type Side } from './conflict';

type Props = {
  clashes: readonly Clash[];
  onSettle: (chosen: Record<string, Side>) => void;
};

function SideOf({
  clash,
  side,
  chosen,
  onChoose,
}: {
  clash: Clash;
  side: Side;
  chosen: Side | undefined;
  onChoose: (side: Side) => void;
}) {
  return (
    <label className="side">
      <input
        type="radio"
        name={`side ${clash.path}`}
        checked={chosen === side}
        onChange={() => {
          onChoose(side);
        }}
      />
      <span>
        <small>{side === 'ours' ? 'Yours' : 'Saved meanwhile'}</small>
        <b>{clash[side]}</b>
      </span>
    </label>
  );
}

/** Says what happened, shows both sides, and sends again once every field is decided. */
export function Clashes({ clashes, onSettle }: Props) {
  const [chosen, setChosen] = useState<Record<string, Side>>({});
  const open = clashes.filter(({ path }) => !chosen[path]).length;
  const [pressed, setPressed] = useState(false);
  return (
    <div className="change-clash">
      <p>
        <b>Not saved yet.</b> Somebody saved this relief basis after you opened it.{' '}
        {clashes.length === 0
          ? 'None of your figures was touched.'
          : 'Choose for each figure which value stands.'}
      </p>
      <div className="conflict">
        {clashes.map((clash) => (
          <div key={clash.path} role="group" aria-label={clash.label}>
            <div className="where">
              {clash.label} <span className="note">was {clash.was}</span>
            </div>
            {(['ours', 'theirs'] as const).map((side) => (
              <SideOf
                key={side}
                clash={clash}
                side={side}
                chosen={chosen[clash.path]}
                onChoose={(taken) => {
                  setChosen({ ...chosen, [clash.path]: taken });
                }}
              />
            ))}
          </div>
        ))}
      </div>
      {pressed && open > 0 && <p className="err">{open} still to choose.</p>}
      <button
        type="button"
        className="btn main"
        onClick={() => {
          setPressed(true);
          if (open === 0) onSettle(chosen);
        }}
      >
        Save on the newer version
      </button>
    </div>
  );
}
