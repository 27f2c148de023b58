/* Opens the editor of a change on the working revision as the server has it, and again after each save. */
import { useEffect, useState } from 'react';
import { type Op } from '@domain/basis';
import { ChangeWork, type PathSection } from './ChangeWork';
import { afterSave, type Loaded, loadPlant } from './load';

export type ChangeLoadProps = {
  api: string;
  paths: readonly string[];
  sections?: readonly PathSection[];
  /** What the page has already sent along; read from `api` when it has not. */
  given?: Loaded;
};

function useLoaded(api: string, given: Loaded | undefined) {
  const [loaded, setLoaded] = useState<Loaded | string | undefined>(given);
  useEffect(() => {
    if (!given) void loadPlant(api).then(setLoaded);
  }, [api, given]);
  const renew = async (version: number, ops: readonly Op[], from: Loaded) => {
    const next = await loadPlant(api);
    const document = afterSave(from.plant.document, ops);
    setLoaded(typeof next === 'string' ? { version, plant: { ...from.plant, document } } : next);
  };
  return { loaded, renew };
}

/** The editor, once its document is there. */
export function ChangeLoad({ api, paths, sections, given }: ChangeLoadProps) {
  const { loaded, renew } = useLoaded(api, given);
  const [saved, setSaved] = useState<number>();
  if (loaded === undefined) return <p role="status">Reading the relief basis.</p>;
  if (typeof loaded === 'string')
    return (
      <p className="err" role="alert">
        {loaded}
      </p>
    );
  return (
    <>
      {saved !== undefined && (
        <p className="note" role="status">
          Saved as version {saved}. <a href="">Reload the page</a> to see the server’s results in every part.
        </p>
      )}
      <ChangeWork
        key={loaded.version}
        source={{ api, paths, ...loaded }}
        sections={sections ?? [{ title: 'Figures', paths }]}
        onSaved={(version, ops) => {
          setSaved(version);
          void renew(version, ops, loaded);
        }}
      />
    </>
  );
}
