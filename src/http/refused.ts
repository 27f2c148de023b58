/* A form that was refused, for the page that shows it again: what was wrong at each field and what had been typed. */

export type Refused = {
  /** The refusal in one sentence. */
  sentence: string;
  code: string;
  /** What is wrong at a field, by the name that it is posted under. */
  error(name: string): string | undefined;
  /** What had been typed into a field; never a password. */
  value(name: string): string | undefined;
  values(name: string): string[];
  /** Everything wrong, each with the field it concerns, for the summary above the form. */
  listed(idOf?: (name: string) => string): { field?: string; sentence: string }[];
};

/** The refusal that this page shows again, undefined on a first visit. */
export function refusedForm({ problem, sent }: Pick<App.Locals, 'problem' | 'sent'>): Refused | undefined {
  if (!problem || sent?.form !== true) return undefined;
  const errors = (problem.errors ?? []).map(({ path, sentence }) => ({
    name: path.replaceAll('/', '.'),
    sentence,
  }));
  const values = (name: string) =>
    /password|token/i.test(name)
      ? []
      : sent.typed.filter(([other]) => other === name).map(([, value]) => value);
  return {
    sentence: problem.detail,
    code: problem.code,
    error: (name) => errors.find((error) => error.name === name)?.sentence,
    value: (name) => values(name)[0],
    values,
    listed: (idOf = (name) => name) =>
      errors.length === 0
        ? [{ sentence: problem.detail }]
        : errors.map(({ name, sentence }) => (name === '' ? { sentence } : { field: idOf(name), sentence })),
  };
}
