/* Bytes of files under their hash: written whole or not at all, the same bytes once. */
import { createHash } from 'node:crypto';
import { mkdir, readFile, rename, stat, writeFile } from 'node:fs/promises';
import { dirname, join } from 'node:path';

function pathOf(folder: string, sha256: string): string {
  return join(folder, 'files', sha256.slice(0, 2), sha256);
}

/** The name under which bytes are kept. */
export function hashOfBytes(bytes: Uint8Array): string {
  return createHash('sha256').update(bytes).digest('hex');
}

/** Keeps bytes below the data folder. */
export async function keepBytes(folder: string, sha256: string, bytes: Uint8Array): Promise<void> {
  const path = pathOf(folder, sha256);
  if (await stat(path).catch(() => undefined)) return;
  await mkdir(dirname(path), { recursive: true });
  const unfinished = `${path}.${String(process.pid)}.${String(Date.now())}`;
  await writeFile(unfinished, bytes);
  await rename(unfinished, path);
}

/** The bytes of a hash; undefined when they are not there. */
export function readBytes(folder: string, sha256: string): Promise<Uint8Array | undefined> {
  return readFile(pathOf(folder, sha256)).catch(() => undefined);
}

const startsWith = (bytes: Uint8Array, text: string, at = 0): boolean =>
  [...text].every((letter, index) => bytes[at + index] === letter.charCodeAt(0));

/** The kind of a picture by its first bytes, never by its name; undefined for anything else. */
export function pictureType(bytes: Uint8Array): 'image/jpeg' | 'image/png' | 'image/webp' | undefined {
  if (bytes[0] === 0xff && bytes[1] === 0xd8 && bytes[2] === 0xff) return 'image/jpeg';
  if (bytes[0] === 0x89 && startsWith(bytes, 'PNG', 1)) return 'image/png';
  if (startsWith(bytes, 'RIFF') && startsWith(bytes, 'WEBP', 8)) return 'image/webp';
  return undefined;
}
