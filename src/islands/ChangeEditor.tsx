/* The change of a relief basis with its effect at once: what stands is shown by the page, the editor comes when somebody edits. */
import './quiet-zod';
import { lazy, type ReactNode, Suspense, useEffect, useState } from 'react';
import { type Basis } from '@domain/basis';
import { type ImportSet } from '@domain/evaluate';
import { type JudgementRules } from '@domain/rules';

type Props = {
  /** Address of the working revision: /api/v1/sites/{site}/cases/{number}/documents/{tag}. */
  api: string;
  /** Paths of the figures that may be edited, and how they are grouped. */
  paths: readonly string[];
  sections?: readonly { title: string; paths: readonly string[] }[];
  /** What the editor would otherwise read from `api`; all of them or none. */
  version?: number;
  document?: Basis;
  base?: Basis | null;
  judgement?: JudgementRules;
  imports?: ImportSet;
  /** True opens the editor with the page. */
  open?: boolean;
  /** What stands now, rendered by the server; shown until the editor opens. */
  children?: ReactNode;
};

const load = () => import('./change/ChangeLoad');
const ChangeLoad = lazy(() =>
  load()
    .then((found) => ({ default: found.ChangeLoad }))
    .catch(() => ({ default: NotLoaded })),
);

function NotLoaded() {
  return (
    <p className="err" role="alert">
      The editor could not be loaded. Reload the page, or use the plain form.
    </p>
  );
}

function givenOf({ version, document, base, judgement, imports }: Props) {
  if (version === undefined || !document || !judgement || !imports) return undefined;
  return { version, plant: { document, base: base ?? null, judgement, imports } };
}

/** Whether something typed earlier waits here to be saved. */
function hasDraft(api: string): boolean {
  try {
    return Object.keys(localStorage).some((key) => key.startsWith(`setwright-change|${api}|`));
  } catch {
    return false;
  }
}

/** The page's own table, then the editor in its place. */
export function ChangeEditor(props: Props) {
  const { api, paths, sections, open = false, children } = props;
  const [opened, setOpened] = useState(false);
  const [given] = useState(() => givenOf(props));
  useEffect(() => {
    // Only the browser knows of drafts, so the page is first shown as the server made it.
    const timer = setTimeout(() => {
      if (open || hasDraft(api)) setOpened(true);
    });
    return () => {
      clearTimeout(timer);
    };
  }, [api, open]);
  if (opened)
    return (
      <Suspense fallback={<p role="status">Loading the editor.</p>}>
        <ChangeLoad api={api} paths={paths} sections={sections} given={given} />
      </Suspense>
    );
  return (
    <div className="change-shut">
      {children}
      <div className="acts pad">
        <button
          type="button"
          className="btn"
          onPointerEnter={() => void load()}
          onFocus={() => void load()}
          onClick={() => {
            setOpened(true);
          }}
        >
          Change figures and see the effect
        </button>
      </div>
    </div>
  );
}
