/* Photographs the gallery at two widths, light and dark, checks it with axe and prints what axe found. Named pages are printed as PDF too. Run: npx tsx tests/support/shoot-gallery.ts [page …] */
import { execFileSync } from 'node:child_process';
import { existsSync, mkdirSync, readdirSync } from 'node:fs';
import { resolve } from 'node:path';
import AxeBuilder from '@axe-core/playwright';
import { chromium, type Browser } from '@playwright/test';

const FOLDER = 'test-results/gallery';
const SHEETS = {
  global: 'src/styles/global.css',
  phone: 'src/styles/phone.css',
  'sign-in': 'src/styles/sign-in.css',
  katex: 'node_modules/katex/dist/katex.css',
};

function bundleStyles(): void {
  for (const [name, file] of Object.entries(SHEETS)) {
    const fonts = ['woff2', 'woff', 'ttf'].map((kind) => `--loader:.${kind}=file`);
    execFileSync('npx', [
      'esbuild',
      file,
      '--bundle',
      '--log-level=error',
      ...fonts,
      `--outfile=${FOLDER}/css/${name}.css`,
    ]);
  }
}

async function shoot(
  browser: Browser,
  page: string,
  width: number,
  theme: 'light' | 'dark',
): Promise<number> {
  const context = await browser.newContext({
    viewport: { width, height: width > 900 ? 900 : 844 },
    colorScheme: theme,
    reducedMotion: 'reduce',
  });
  const tab = await context.newPage();
  await tab.goto(`file://${resolve(FOLDER, page)}.html`);
  await tab.evaluate(() => document.fonts.ready);
  const beyond = await tab.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  );
  if (beyond > 0) process.stdout.write(`${page} ${width}: ${beyond} px wider than the screen\n`);
  await tab.screenshot({ path: `${FOLDER}/shots/${page}-${width}-${theme}.png`, fullPage: true });
  // Both grounds and both widths are seen by one run each.
  if (width > 900 !== (theme === 'light')) {
    await context.close();
    return beyond > 0 ? 1 : 0;
  }
  const { violations } = await new AxeBuilder({ page: tab })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'])
    .analyze();
  for (const { id, help, nodes } of violations) {
    process.stdout.write(
      `${page} ${width} ${theme}: ${id}: ${help}: ${nodes
        .slice(0, 3)
        .map((node) => `${node.html.slice(0, 120)} ${node.failureSummary?.split('\n')[1] ?? ''}`)
        .join(' | ')}\n`,
    );
  }
  await context.close();
  return violations.length + (beyond > 0 ? 1 : 0);
}

const asked = process.argv.slice(2);
const pages = readdirSync(FOLDER)
  .filter((file) => file.endsWith('.html'))
  .map((file) => file.replace('.html', ''))
  .filter((page) => asked.length === 0 || asked.includes(page));
mkdirSync(`${FOLDER}/shots`, { recursive: true });
bundleStyles();
const executablePath = process.env['CHROMIUM_PATH'] ?? '/usr/bin/chromium';
const browser = await chromium.launch({
  args: ['--no-sandbox', '--disable-gpu'],
  ...(existsSync(executablePath) ? { executablePath } : {}),
});
let faults = 0;
for (const page of pages) {
  for (const width of [1440, 390])
    for (const theme of ['light', 'dark'] as const) faults += await shoot(browser, page, width, theme);
}
for (const page of asked.length > 0 ? pages : []) {
  const tab = await browser.newPage();
  await tab.goto(`file://${resolve(FOLDER, page)}.html`);
  await tab.pdf({ path: `${FOLDER}/shots/${page}.pdf`, preferCSSPageSize: true, printBackground: true });
  await tab.close();
}
await browser.close();
process.stdout.write(`${pages.length} pages, ${faults} faults\n`);
process.exitCode = faults === 0 ? 0 : 1;
