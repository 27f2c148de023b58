/* Acts as a list: what it is, with a link to its form, and the reason where it has to wait. */
import { linkOf, type OfferedAct, sentenceCase } from './groups';

type Props = {
  acts: readonly OfferedAct[];
  base: string;
  links?: Readonly<Record<string, string>>;
  /** Where each act leads, once the machine has said so. */
  next?: ReadonlyMap<string, string>;
  linked?: boolean;
};

/** One line an act. */
export function ActList({ acts, base, links, next, linked = false }: Props) {
  return (
    <ul className="may-list">
      {acts.map(({ act, words, sentence }) => (
        <li key={act}>
          {linked ? (
            <a href={linkOf(act, base, links)}>{sentenceCase(words)}</a>
          ) : (
            <b>{sentenceCase(words)}</b>
          )}
          {sentence && <span className="note"> {sentence}</span>}
          {next?.has(act) && <span className="note"> {next.get(act)}</span>}
        </li>
      ))}
    </ul>
  );
}
