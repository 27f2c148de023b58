/* Small helpers that every picture shares: rounding of coordinates, escaping, joining of paths. */

/** A coordinate, rounded to a tenth of a pixel. */
export function px(value: number): number {
  return Math.round(value * 10) / 10;
}

/** Text made safe for element content and attributes. */
export function escapeText(text: string): string {
  return text
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;')
    .replaceAll("'", '&#39;');
}

/** A path with a class. */
export function path(name: string, d: string): string {
  return `<path class="${name}" d="${d}"/>`;
}

/** A text with a class at a place; `anchor` as in SVG. */
export function text(name: string, x: number, y: number, content: string, anchor?: 'middle' | 'end'): string {
  const at = anchor ? ` text-anchor="${anchor}"` : '';
  return `<text class="${name}" x="${px(x)}" y="${px(y)}"${at}>${escapeText(content)}</text>`;
}
