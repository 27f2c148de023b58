/* Command line of the engine: reads one calculation or a list as JSON, prints the sheets as JSON. */
import { readFileSync } from 'node:fs';
import { type CalcRequest, calculate } from '../src/engine/calc';

/** Reads a file, or standard input when the name is `-`. */
function read(file: string): string {
  return readFileSync(file === '-' ? 0 : file, 'utf8');
}

function say(sentence: string): void {
  process.stderr.write(`${sentence}\n`);
  process.exitCode = 1;
}

/** Works the file's request or requests and prints the answer in the same form (one, or a list). */
function main(file: string | undefined): void {
  if (file === undefined)
    return say(
      'Usage: npm run --silent calc -- FILE   (JSON { topic, inputs } or a list; - for standard input)',
    );
  let body: unknown;
  try {
    body = JSON.parse(read(file));
  } catch (error) {
    return say(`${file} cannot be read as JSON: ${error instanceof Error ? error.message : String(error)}`);
  }
  const answer = Array.isArray(body)
    ? body.map((one: CalcRequest) => calculate(one))
    : calculate(body as CalcRequest);
  process.stdout.write(`${JSON.stringify(answer, null, 2)}\n`);
}

main(process.argv[2]);
