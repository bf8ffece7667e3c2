import { crc32, deflateSync } from 'node:zlib';

/** A chunk by ISO/IEC 15948: length, type, data, CRC-32 of type and data. */
function chunk(type: string, data: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data]);
  const frame = Buffer.alloc(8);
  frame.writeUInt32BE(data.length, 0);
  frame.writeUInt32BE(crc32(body), 4);
  return Buffer.concat([frame.subarray(0, 4), body, frame.subarray(4)]);
}

/** A grey PNG of this size, in pixels, whose checksums are right. */
export function png(width: number, height: number): Buffer {
  const header = Buffer.alloc(13);
  header.writeUInt32BE(width, 0);
  header.writeUInt32BE(height, 4);
  header.set([8, 0, 0, 0, 0], 8);
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
    chunk('IHDR', header),
    chunk('IDAT', deflateSync(Buffer.alloc((width + 1) * Math.min(height, 10)))),
    chunk('IEND', Buffer.alloc(0)),
  ]);
}

/** A JPEG's skeleton by ITU-T T.81: start, an application segment, a baseline frame header, end. */
export function jpeg(width: number, height: number): Buffer {
  const frame = Buffer.from([0xff, 0xc0, 0, 11, 8, 0, 0, 0, 0, 1, 1, 0x11, 0]);
  frame.writeUInt16BE(height, 5);
  frame.writeUInt16BE(width, 7);
  return Buffer.concat([
    Buffer.from([0xff, 0xd8, 0xff, 0xe0, 0, 4, 1, 1]),
    frame,
    Buffer.alloc(20),
    Buffer.from([0xff, 0xd9]),
  ]);
}

/** An SVG of this drawing; 40 by 30 user units unless `head` says otherwise. */
export const svg = (inside: string, head = 'viewBox="0 0 40 30"') =>
  Buffer.from(
    `<svg xmlns="http://www.w3.org/2000/svg" xmlns:xlink="http://www.w3.org/1999/xlink" ${head}>${inside}</svg>`,
  );
