/* Command line of the engine: a JSON document of cases in, one answer a case out, in the same order. */
import { readFileSync } from 'node:fs';
import { casesOf, workCase } from '../src/engine/calc';

const USAGE =
  'Usage: npm run --silent calc -- FILE [--sheet]   (- for standard input; FILE holds { "cases": [{ "id", "topic", "inputs", "want" }] })';

function fail(sentence: string): void {
  process.stderr.write(`${sentence}\n`);
  process.exitCode = 1;
}

/** The document of a file, or of standard input when the name is `-`. */
function read(file: string): unknown {
  return JSON.parse(readFileSync(file === '-' ? 0 : file, 'utf8').replace(/^\uFEFF/, ''));
}

/** Works the cases of the file and prints `{ "results": [ … ] }`; exit code 0 when every case was worked, else 1. */
function main(args: readonly string[]): void {
  const sheet = args.includes('--sheet');
  const unknown = args.find((arg) => arg.startsWith('--') && arg !== '--sheet');
  const [file, ...more] = args.filter((arg) => !arg.startsWith('--'));
  if (unknown !== undefined || file === undefined || more.length > 0) return fail(USAGE);
  let document: unknown;
  try {
    document = read(file);
  } catch (error) {
    return fail(`${file} can't be read as JSON: ${error instanceof Error ? error.message : String(error)}`);
  }
  const found = casesOf(document);
  if ('wrong' in found) return fail(`${file}: ${found.wrong}`);
  const results = found.cases.map((one) => workCase(one, { sheet }));
  process.stdout.write(`${JSON.stringify({ results }, null, 1)}\n`);
  if (results.some((one) => one.error)) process.exitCode = 1;
}

main(process.argv.slice(2));
