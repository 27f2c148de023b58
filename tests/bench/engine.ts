/* `npm run bench:engine`: what one core works in a second, by topic, bare and with its sheet; prints targets beside what was measured. */
import { availableParallelism, cpus, loadavg } from 'node:os';
import { BARE } from './engine/bare';
import { ratePerSecond, sink } from './engine/measure';
import { mixtureNozzle, waterNozzle } from './engine/nozzles';
import { workPlant, workPlantShared } from './engine/plant';
import { sheetForms } from './engine/sheets';

/** Calls a second that are asked for. */
const BARE_TARGETS: Record<string, number> = {
  'a.gas': 4_000_000,
  'd.omega-saturated': 2_000_000,
  'g.outlet-isothermal': 400_000,
  'f.control-valve-gas': 500_000,
  'g.outlet-fanno, two segments': 50_000,
};
const SHEET_TARGETS: Record<string, number> = { 'a.gas': 60_000 };
const WATER_MS = 2;
const MIXTURE_MS = 20;
const BASES = 2000;
const BASES_SECONDS = 4;

const say = (text: string) => process.stdout.write(`${text}\n`);
const number = (value: number) => Math.round(value).toLocaleString('en-GB');
let missed = 0;

function verdict(good: boolean, target: string): string {
  if (!good) missed += 1;
  return `${good ? 'within' : 'MISSES'} ${target}`;
}

function rateRow(name: string, rate: number, target: number | undefined): string {
  const told = target === undefined ? '' : verdict(rate >= target, `≥ ${number(target)}/s`);
  return `${name.padEnd(40)} ${number(rate).padStart(14)}/s   ${told}`.trimEnd();
}

function rates(): void {
  say('\nBare: numbers in SI, no sheet');
  for (const [name, form] of Object.entries(BARE))
    say(rateRow(name, ratePerSecond(form), BARE_TARGETS[name]));
  say('\nWith sheet: a case of the check values, as the command line works it');
  for (const [topic, form] of sheetForms()) say(rateRow(topic, ratePerSecond(form), SHEET_TARGETS[topic]));
}

function nozzles(): void {
  say('\nNozzles by direct integration, from the fluid to the throat');
  const row = (name: string, form: (i: number) => void, limit: number) => {
    const ms = 1000 / ratePerSecond(form);
    say(`${name.padEnd(40)} ${ms.toFixed(2).padStart(13)} ms   ${verdict(ms <= limit, `≤ ${limit} ms`)}`);
  };
  row('water, saturated liquid', waterNozzle, WATER_MS);
  const mixture = mixtureNozzle();
  if (mixture) row('ten components, Peng–Robinson', mixture, MIXTURE_MS);
  else
    say(
      `ten components, Peng–Robinson: ${verdict(false, `≤ ${MIXTURE_MS} ms`)} (this engine has no mixture nozzle)`,
    );
}

async function plant(): Promise<void> {
  say(`\nA plant of ${number(BASES)} bases evaluated again`);
  let done = 0;
  const each = () => {
    done += 1;
    if (process.stderr.isTTY && done % 100 === 0) process.stderr.write(`\r${number(done)} bases`);
  };
  const one = workPlant(0, BASES, each);
  say(
    `one thread       ${one.seconds.toFixed(2)} s (${one.processor.toFixed(2)} s of processor, ${number(one.sheets)} sheets)`,
  );
  const shared = await workPlantShared(BASES, each);
  say(`${availableParallelism()} worker threads ${shared.toFixed(2)} s, their start not counted`);
  const best = Math.min(one.seconds, shared);
  say(
    `${best < one.seconds ? 'worker threads are faster' : 'one thread is faster'}: ${best.toFixed(2)} s   ${verdict(best <= BASES_SECONDS, `≤ ${BASES_SECONDS} s`)}`,
  );
}

const [cpu] = cpus();
say(
  `${cpu?.model ?? 'unknown processor'}, Node ${process.version}; load ${loadavg()
    .map((one) => one.toFixed(1))
    .join(' ')}`,
);
say('Rates are by the processor time of this process, best of five slices, on one core.');
rates();
nozzles();
await plant();
say(
  `\n${missed === 0 ? 'All targets are met.' : `${missed} targets are missed.`} (${sink.total === 0 ? 'nothing worked' : 'checked'})`,
);
process.exitCode = missed === 0 ? 0 : 1;
