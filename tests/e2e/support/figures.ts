/* Figures of results as a page shows them, and where they turn up again. */

/** Cells of tables, and the rows of lists that open in place. */
const cells = /<(t[dh]|summary)[^>]*>([\s\S]*?)<\/\1>/g;
/** 15 076, 2 993.9, 81.3: digits with thin, narrow or plain spaces between thousands. */
const numbers =
  /(?<![\w.,/-])\d{1,3}(?:[\s\u2009\u202f\u00a0]\d{3})*(?:\.\d+)?(?![\w])|(?<![\w.,/-])\d+\.\d+(?![\w])|(?<![\w.,/-])\d{4,6}(?![\w])/g;

/** The words of a page, without marks and pictures. */
export function plainText(html: string): string {
  return html
    .replace(/<(svg|script|style)[\s\S]*?<\/\1>/g, ' ')
    .replace(/<[^>]+>/g, ' ')
    .replace(/&nbsp;|&#160;/g, ' ');
}

function digits(text: string): string {
  return text.replace(/[\s\u2009\u202f\u00a0]/g, '');
}

/** Every figure of a text that tells something: three digits with a decimal point or four without; years tell nothing. */
export function figuresOf(text: string): Set<string> {
  const found = (text.match(numbers) ?? []).map(digits);
  const tells = (one: string) =>
    one.replace(/^0\.0*|\./g, '').length >= (one.includes('.') ? 3 : 4) && !/^20\d\d$/.test(one);
  return new Set(found.filter(tells));
}

/** The figures in the cells of a page's tables and in the rows of its lists. */
export function figuresInTables(html: string): Set<string> {
  return figuresOf([...html.matchAll(cells)].map((cell) => plainText(cell[2] ?? '')).join(' | '));
}

/** Those of `secret` that a body shows, as words or within its marks; a figure of three digits counts in words only. */
export function leaks(secret: ReadonlySet<string>, body: string): string[] {
  const words = figuresOf(plainText(body));
  const raw = figuresOf(body.replace(/[0-9a-f]{32,64}/g, ' '));
  return [...secret].filter((one) => words.has(one) || (one.replace('.', '').length >= 4 && raw.has(one)));
}
