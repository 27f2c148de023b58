/* The fields of a filter bar. */

export type Filter =
  | { kind: 'text'; name: string; label: string; value?: string }
  | {
      kind: 'select';
      name: string;
      label: string;
      value?: string;
      options: { value: string; label: string }[];
    };
