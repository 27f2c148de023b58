/* The key of a sheet in an address: it holds a colon and slashes, which may come encoded or plain. */

/** The key as it was encoded; a text that is no encoding stays as it is and is found nowhere. */
export function sheetKeyOf(param: string | undefined): string {
  const text = param ?? '';
  try {
    return decodeURIComponent(text);
  } catch {
    return text;
  }
}
