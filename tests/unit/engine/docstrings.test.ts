/* The engine is read by engineers: every exported name is documented, every file says what it is for, none grows too long. */
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';

const ROOT = join(import.meta.dirname, '../../../src/engine');
const FILES = readdirSync(ROOT, { recursive: true, encoding: 'utf8' }).filter((name) => name.endsWith('.ts'));

/** Exported declarations whose line above does not end a doc comment. */
function undocumented(source: string): string[] {
  const lines = source.split('\n');
  return lines.flatMap((line, i) => {
    const declared = /^export (?:async )?(?:function|const|class|type|interface) (\w+)/.exec(line);
    return declared?.[1] && !(i > 1 && lines[i - 1]?.trimEnd().endsWith('*/')) ? [declared[1]] : [];
  });
}

describe.each(FILES)('src/engine/%s', (name) => {
  const source = readFileSync(join(ROOT, name), 'utf8');
  it('documents what it exports, opens with its purpose, keeps to 250 lines and to named exports', () => {
    expect(undocumented(source)).toEqual([]);
    expect(source).toMatch(/^\/\* .+\*\/\n/);
    expect(source.split('\n').length).toBeLessThanOrEqual(251);
    expect(source).not.toMatch(/export default/);
  });
});

describe('the check itself', () => {
  it('finds an export without a docstring', () => {
    expect(undocumented('/* A file. */\nexport function bare(): void {}\n')).toEqual(['bare']);
    expect(
      undocumented('/* A file. */\n\nexport const bare = 1;\n/** Said. */\nexport const said = 2;\n'),
    ).toEqual(['bare']);
  });
});
