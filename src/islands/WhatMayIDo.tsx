/* What the signed-in person may do next in a case, and why not the rest; whole without script, then the machine adds where each act leads. */
import './quiet-zod';
import { lazy, Suspense, useSyncExternalStore } from 'react';
import { type ActNextProps } from './acts/ActNext';
import { ActList } from './acts/ActList';
import { type MachineProps, type OfferedAct, sortActs } from './acts/groups';

type Props = {
  /** `frame.acts` of the case page: the server's answer to each act. */
  acts: readonly OfferedAct[];
  /** `frame.machine`: what the machine needs to stand where the case stands. */
  machine: MachineProps;
  /** `frame.base`: address of the case. */
  base: string;
  /** Act → address, where a form is elsewhere than in the part that usually holds it. */
  links?: Readonly<Record<string, string>>;
  /** The page lists the open points of the gate beside it already. */
  pointsBeside?: boolean;
};

/** The machine comes after the page: what is possible is told before any of it runs, and stands if it never comes. */
const ActNext = lazy(() =>
  import('./acts/ActNext')
    .then((found) => ({ default: found.ActNext }))
    .catch(() => ({ default: ({ children }: ActNextProps) => <>{children(new Map())}</> })),
);

function useInBrowser(): boolean {
  return useSyncExternalStore(
    () => () => undefined,
    () => true,
    () => false,
  );
}

function OpenPoints({ machine, base }: Pick<Props, 'machine' | 'base'>) {
  const site = base.replace(/\/cases\/.*$/, '');
  if (machine.open.length === 0) return null;
  return (
    <ol className="may-open">
      {machine.open.map(({ code, sentence, where }) => (
        <li key={`${code} ${where}`}>
          {sentence} <a href={`${site}/${where}`}>Go there</a>
        </li>
      ))}
    </ol>
  );
}

/** The list of acts, in sentences. */
export function WhatMayIDo({ acts, machine, base, links, pointsBeside = false }: Props) {
  const inBrowser = useInBrowser();
  const { now, later, never, notNow } = sortActs(acts);
  const list = (next?: ReadonlyMap<string, string>) => (
    <ActList acts={now} base={base} links={links} next={next} linked />
  );
  const waits = !pointsBeside && later.some(({ code }) => code === 'GATE_SHUT');
  return (
    <div className="may">
      <h3>You may now</h3>
      {now.length === 0 && <p className="note">Nothing in this case waits for you at this stage.</p>}
      {inBrowser && now.length > 0 ? (
        <Suspense fallback={list()}>
          <ActNext acts={now.map(({ act }) => act)} machine={machine}>
            {list}
          </ActNext>
        </Suspense>
      ) : (
        list()
      )}
      {later.length > 0 && (
        <>
          <h3>Not yet</h3>
          <ActList acts={later} base={base} links={links} />
          {waits && <OpenPoints machine={machine} base={base} />}
        </>
      )}
      {never.length + notNow.length > 0 && (
        <details>
          <summary className="more">What you may not do here, and why</summary>
          <ActList acts={[...never, ...notNow]} base={base} />
        </details>
      )}
    </div>
  );
}
