/* How hint and error of a field are tied to it for assistive technology. */

/** Value of aria-describedby: the ids of hint and error, as far as they exist. */
export function describedBy(id: string, hint?: string, error?: string): string | undefined {
  const ids = [hint ? `${id}-hint` : '', error ? `${id}-error` : ''].filter((part) => part !== '');
  return ids.length > 0 ? ids.join(' ') : undefined;
}
