/* Runs other programs so that a signal to the script reaches them and nothing stays behind. */
import { spawn } from 'node:child_process';
import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The top folder of the project. */
export const ROOT = dirname(dirname(dirname(fileURLToPath(import.meta.url))));

/** Runs a program in the project's folder, its output shown as it comes; answers its exit code (128 + n after a signal). */
export function run(command, args, env = {}) {
  return new Promise((resolve) => {
    const child = spawn(command, args, { cwd: ROOT, stdio: 'inherit', env: { ...process.env, ...env } });
    const pass = (signal) => child.kill(signal);
    process.on('SIGTERM', pass);
    process.on('SIGINT', pass);
    const end = (code) => {
      process.off('SIGTERM', pass);
      process.off('SIGINT', pass);
      resolve(code);
    };
    child.on('error', (error) => {
      process.stderr.write(`${command} can't be run: ${error.message}\n`);
      end(127);
    });
    child.on('exit', (code, signal) => end(code ?? (signal === 'SIGINT' ? 130 : 143)));
  });
}

/** Runs a script of one of the installed packages with this very Node. */
export function runBin(path, args, env) {
  return run(process.execPath, [`${ROOT}/node_modules/${path}`, ...args], env);
}

/** Prints a line of ours. */
export function say(text) {
  process.stdout.write(`${text}\n`);
}

/** Ends the script with the code of a step that failed. */
export function stopUnless(code, text) {
  if (code === 0) return;
  process.stderr.write(`${text}\n`);
  process.exit(code);
}
