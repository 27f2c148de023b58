/* Stand-ins for the photographs of field sheets: small plain pictures, each of its own shade, so that evidence has a file. */
import { createHash } from 'node:crypto';
import { crc32, deflateSync } from 'node:zlib';
import { insert } from '@data/mapping';
import { FILES } from '@data/tables/field';
import { SITE_ID, type World } from './world';

const WIDTH = 32;
const HEIGHT = 24;
const SIGNATURE = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);

function chunk(type: string, data: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(type, 'ascii'), data]);
  const [length, check] = [Buffer.alloc(4), Buffer.alloc(4)];
  length.writeUInt32BE(data.length);
  check.writeUInt32BE(crc32(body));
  return Buffer.concat([length, body, check]);
}

/** A plain picture in PNG (ISO/IEC 15948): one colour, told by a number. */
export function plainPicture(shade: number): Buffer {
  const header = Buffer.alloc(13);
  header.writeUInt32BE(WIDTH, 0);
  header.writeUInt32BE(HEIGHT, 4);
  header.set([8, 2, 0, 0, 0], 8);
  const colour = [150 + (shade % 60), 140 + ((shade * 7) % 60), 120 + ((shade * 13) % 60)];
  const row = Buffer.from([0, ...Array.from({ length: WIDTH }, () => colour).flat()]);
  const pixels = deflateSync(Buffer.concat(Array.from({ length: HEIGHT }, () => row)));
  const title = chunk('tEXt', Buffer.from(`Title\0photo ${String(shade)}`, 'latin1'));
  return Buffer.concat([
    SIGNATURE,
    chunk('IHDR', header),
    title,
    chunk('IDAT', pixels),
    chunk('IEND', Buffer.alloc(0)),
  ]);
}

/** Keeps the bytes of a file under their hash, where the installation keeps its files. */
export type StoreFile = (sha256: string, bytes: Buffer) => Promise<void>;

/** The id of the file of a photograph. */
export const photoId = (number: number): string => `file_photo${String(number)}`;

/** Writes the file of a photograph; its name keeps the number that the field sheet tells. */
export async function writePhoto(world: World, id: string, by: string, at: string): Promise<void> {
  const number = Number(id.replace('file_photo', ''));
  const bytes = plainPicture(number);
  const sha256 = createHash('sha256').update(bytes).digest('hex');
  await world.storeFile?.(sha256, bytes);
  await insert(world.trx, FILES, {
    id,
    siteId: SITE_ID,
    sha256,
    bytes: bytes.length,
    type: 'image/png',
    name: `photo-${String(number)}.png`,
    state: 'referred',
    byId: by,
    at,
  });
}
