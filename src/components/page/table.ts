/* What a plain table is made of. */

export type Column = {
  label: string;
  /** Second line of the head. */
  unit?: string;
  figures?: boolean;
  /** Sorts by a link under this name. */
  sort?: string;
};
export type Cell =
  | string
  | {
      text: string;
      href?: string;
      class?: string;
      /** Markup of a picture of ours, never of a person. */ svg?: string;
    }
  | undefined;
