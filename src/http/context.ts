/* What the helpers need of Astro's context, so that an endpoint and a page can both hand theirs over. */
import { type APIContext } from 'astro';

export type Context = Pick<APIContext, 'request' | 'locals' | 'url' | 'rewrite'>;

/** A body that was read. */
export type Sent = {
  form: boolean;
  body: unknown;
  /** The fields of a form as typed, without ours. */
  typed: [string, string][];
  /** The files of a form that were really chosen, with the names of their fields. */
  files?: [string, File][];
  version?: string | undefined;
  key?: string | undefined;
  back?: string | undefined;
  method?: string | undefined;
};
