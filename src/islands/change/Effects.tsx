/* The effect of what is typed: each group's governing scenario, areas, use and verdict now beside the revision in force, and the outcomes. */
import { orificeBar, scaleMax } from '@components/pictures/orifice';
import { verdictMark, VERDICT_WORDS } from '@components/pictures/marks';
import { convert, formatNumber, formatQuantity, type Q } from '@engine/quantity';
import { type Verdict } from '@domain/evaluate';
import { type Outcome } from '@domain/rulebook';
import { type Effect, type GroupEffect } from './work';

/** Use in percent of the installed area, for reading. */
export function percentOf(use: number | undefined): string {
  return use === undefined ? '–' : `${formatNumber(use * 100, 1)} %`;
}

function Bar({ group }: { group: GroupEffect }) {
  const { installed, installedBefore, required, requiredBefore } = group;
  if (!installed) return null;
  const unit = installed.unit === 'in2' ? 'in²' : 'mm²';
  const area = (q: Q | undefined) => q && convert(q, unit === 'in²' ? 'in2' : 'mm2');
  const areas = [installed, installedBefore, required, requiredBefore].flatMap((q) => area(q) ?? []);
  const scale = {
    max: scaleMax(areas),
    unit,
    installed: area(installed) ?? 0,
    present: area(installedBefore),
  } as const;
  const svg = orificeBar(scale, { required: area(required), before: area(requiredBefore), height: 26 });
  return <div className="change-bar" dangerouslySetInnerHTML={{ __html: svg }} />;
}

function VerdictOf({ verdict }: { verdict: Verdict }) {
  return (
    <span className={`verdict ${verdict}`}>
      <span dangerouslySetInnerHTML={{ __html: verdictMark(verdict) }} />
      {VERDICT_WORDS[verdict]}
    </span>
  );
}

const area = (q: Q | undefined) => (q ? formatQuantity(q) : '–');

function Row({ name, before, now }: { name: string; before: string; now: string }) {
  return (
    <tr>
      <th scope="row">{name}</th>
      <td className="num">{before}</td>
      <td className={before === now ? 'num' : 'num new'}>{now}</td>
    </tr>
  );
}

function Group({ group }: { group: GroupEffect }) {
  const was = group.before ? VERDICT_WORDS[group.before] : '–';
  return (
    <section className="change-group" aria-label={group.name}>
      <h4>{group.name}</h4>
      <p>
        <VerdictOf verdict={group.verdict} />
      </p>
      <Bar group={group} />
      <table className="attr">
        <thead>
          <tr>
            <td />
            <th scope="col">In force</th>
            <th scope="col">As typed</th>
          </tr>
        </thead>
        <tbody>
          <Row name="Governing scenario" before={group.governedBefore ?? '–'} now={group.governing ?? '–'} />
          <Row name="Required area" before={area(group.requiredBefore)} now={area(group.required)} />
          <Row name="Installed area" before={area(group.installedBefore)} now={area(group.installed)} />
          <Row name="Used" before={percentOf(group.useBefore)} now={percentOf(group.use)} />
          <Row name="Verdict" before={was} now={VERDICT_WORDS[group.verdict]} />
        </tbody>
      </table>
    </section>
  );
}

function Sentences({ title, list }: { title: string; list: readonly string[] }) {
  if (list.length === 0) return null;
  return (
    <>
      <h4>{title}</h4>
      <ul className="change-list">
        {list.map((sentence) => (
          <li key={sentence}>{sentence}</li>
        ))}
      </ul>
    </>
  );
}

const sentencesOf = (outcomes: readonly Outcome[]) => [
  ...new Set(outcomes.map(({ tag, sentence }) => `${tag}: ${sentence}`)),
];

/** The panel beside the fields. */
export function Effects({ effect }: { effect: Effect | string }) {
  if (typeof effect === 'string') return <p className="err">{effect}</p>;
  const { groups, fresh, cleared, refused } = effect;
  return (
    <div className="change-effect">
      {groups.map((group) => (
        <Group key={group.id} group={group} />
      ))}
      {groups.length === 0 && (
        <p className="note">No group of relief points is stated, so nothing is sized.</p>
      )}
      <p className="note">
        {fresh.length} new {fresh.length === 1 ? 'outcome' : 'outcomes'}, {cleared.length} cleared.
      </p>
      <Sentences title="New" list={sentencesOf(fresh)} />
      <Sentences title="Cleared" list={sentencesOf(cleared)} />
      <Sentences title="Not worked" list={refused.slice(0, 4)} />
    </div>
  );
}
