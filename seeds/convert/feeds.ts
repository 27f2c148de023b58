/* Feeds: the machines, valves and surfaces from which loads come, as sources whose figures the loads use. */
import { type Input, type Source } from '@domain/basis';
import supplement from '../data/supplement/feeds.json';
import { type DemoInput, type DemoQ, type DemoSystem } from './demo-types';
import { compact, figureOf } from './figures';
import { idOf } from './ids';

type Field = { input: string; cause: string; group: string; path: string };
type Feed = {
  tag: string;
  kind?: string;
  name?: string;
  equipment?: string;
  impeller?: DemoQ;
  tagFrom?: string;
  fields: Field[];
};
const FEEDS: Record<string, Feed[] | undefined> = supplement as never;

/** An input that stands on a source: whoever has the same name, value and origin uses it from there. */
export type Link = { input: string; value: unknown; unit: string; ref: string | undefined; use: string };

function inputAt(system: DemoSystem, field: Field): DemoInput | undefined {
  const cause = system.causes.find((candidate) => candidate.cause === field.cause);
  return cause?.answers?.find((answer) => answer.group === field.group)?.load.inputs[field.input];
}

const TAG = /[A-Z]{2,3}-\d{3}[A-Z]?/;

/** The tag of a feed; a temporary stand-in carries the tag that its data sheet names. */
function tagOf(system: DemoSystem, feed: Feed): string {
  const field = feed.fields.find((candidate) => candidate.input === feed.tagFrom);
  const reference = field && inputAt(system, field)?.origin?.reference;
  return (reference === undefined ? undefined : TAG.exec(reference)?.[0]) ?? feed.tag;
}

function write(source: Record<string, unknown>, path: string, value: unknown): void {
  const [part = '', name = ''] = path.split('/');
  source[part] = { ...(source[part] as object | undefined), [name]: value };
}

function beginning(feed: Feed, tag: string): Record<string, unknown> {
  const pump =
    feed.kind === 'pump'
      ? compact({ displacement: 'centrifugal', impeller: feed.impeller && figureOf(feed.impeller) })
      : undefined;
  const equipment = feed.equipment === undefined ? undefined : idOf('eq', feed.equipment);
  return compact({ id: idOf('src', tag), tag, name: feed.name, equipment, kind: feed.kind, pump });
}

/** The sources that feed a system, beyond the machines among its equipment. */
export function feedSources(system: DemoSystem): Source[] {
  return (FEEDS[system.id] ?? [])
    .filter(
      (feed) =>
        feed.kind !== undefined && !system.equipment.some((item) => item.tag === feed.tag && item.trim),
    )
    .map((feed) => {
      const source = beginning(feed, tagOf(system, feed));
      for (const field of feed.fields) {
        const input = inputAt(system, field);
        if (typeof input?.value === 'number')
          write(source, field.path, figureOf({ ...input, value: input.value }));
      }
      return source as unknown as Source;
    });
}

/** The links from inputs to sources of a system. */
export function linksOf(system: DemoSystem): Link[] {
  return (FEEDS[system.id] ?? []).flatMap((feed) =>
    feed.fields.flatMap((field) => {
      const input = inputAt(system, field);
      if (typeof input?.value !== 'number') return [];
      const use = `sources/${idOf('src', tagOf(system, feed))}/${field.path}`;
      return [
        { input: field.input, value: input.value, unit: input.unit, ref: input.origin?.reference, use },
      ];
    }),
  );
}

/** The source that an input stands on, when it carries the same value from the same origin. */
export function linked(links: readonly Link[], name: string, input: DemoInput): Input | undefined {
  const link = links.find(
    (candidate) =>
      candidate.input === name &&
      candidate.value === input.value &&
      candidate.unit === input.unit &&
      candidate.ref === input.origin?.reference,
  );
  return link && { use: link.use };
}
