import { crc32 } from 'node:zlib';

import { FIGURE_MAX_BYTES } from '#shared/contracts/figures.ts';

import type { InspectedPicture, PictureVerdict } from '../task-types.ts';
import { isSvgText, sanitiseSvg } from './sanitise-svg.ts';
import { UnusablePicture } from './unusable-picture.ts';

const PNG_START = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
/** Pictures larger than this in either direction would not help a reader, and would burden every export. */
const MOST_PIXELS = 8_000;
/** An SVG beyond this is no line drawing any more, and slow to read and to print. */
const MOST_SVG_BYTES = 1024 * 1024;

const DAMAGED_PNG = 'This PNG is damaged. Save the picture again and choose the new file.';
const DAMAGED_JPEG = 'This JPEG is damaged. Save the picture again and choose the new file.';

/**
 * Walks the chunks of a PNG (ISO/IEC 15948: length, type, data, CRC-32 of type and data) from IHDR to IEND.
 * Gives the size and the bytes up to IEND, so that nothing hides behind the picture.
 */
function readPng(bytes: Buffer): InspectedPicture {
  let at = PNG_START.length;
  let size: { width: number; height: number } | null = null;
  let hasData = false;
  while (at + 12 <= bytes.length) {
    const length = bytes.readUInt32BE(at);
    const end = at + 12 + length;
    if (end > bytes.length) break;
    const type = bytes.toString('latin1', at + 4, at + 8);
    if (crc32(bytes.subarray(at + 4, end - 4)) !== bytes.readUInt32BE(end - 4)) break;
    if (size === null) {
      if (type !== 'IHDR' || length !== 13) break;
      size = { width: bytes.readUInt32BE(at + 8), height: bytes.readUInt32BE(at + 12) };
    }
    hasData ||= type === 'IDAT';
    if (type === 'IEND' && hasData) {
      return { mediaType: 'image/png', bytes: bytes.subarray(0, end), ...size };
    }
    at = end;
  }
  throw new UnusablePicture(DAMAGED_PNG);
}

/** Markers of JPEG frame headers (ITU-T T.81, table B.1), which hold the size. */
const isFrame = (marker: number) =>
  marker >= 0xc0 && marker <= 0xcf && marker !== 0xc4 && marker !== 0xc8 && marker !== 0xcc;

/** Walks the segments of a JPEG to its frame header; the end-of-image marker must close the file. */
function readJpeg(bytes: Buffer): InspectedPicture {
  const close = bytes.lastIndexOf(Buffer.from([0xff, 0xd9]));
  let at = 2;
  while (at + 9 < close && bytes[at] === 0xff) {
    const marker = bytes[at + 1] ?? 0;
    if (marker === 0xff) {
      at += 1;
      continue;
    }
    if (isFrame(marker)) {
      const size = { height: bytes.readUInt16BE(at + 5), width: bytes.readUInt16BE(at + 7) };
      return { mediaType: 'image/jpeg', bytes: bytes.subarray(0, close + 2), ...size };
    }
    at += 2 + bytes.readUInt16BE(at + 2);
  }
  throw new UnusablePicture(DAMAGED_JPEG);
}

function read(bytes: Buffer): InspectedPicture {
  if (bytes.length > FIGURE_MAX_BYTES) {
    throw new UnusablePicture('A figure may have at most 4 MB. Make the picture smaller.', 'tooLarge');
  }
  if (bytes.subarray(0, PNG_START.length).equals(PNG_START)) return readPng(bytes);
  if (bytes[0] === 0xff && bytes[1] === 0xd8 && bytes[2] === 0xff) return readJpeg(bytes);
  const text = bytes.toString('utf8').replace(/^\uFEFF/, '');
  if (!isSvgText(text)) {
    throw new UnusablePicture('This file is no picture that can be printed. Choose a PNG, a JPEG or an SVG.');
  }
  if (bytes.length > MOST_SVG_BYTES) {
    throw new UnusablePicture(
      'An SVG may have at most 1 MB. Simplify the drawing, or save it as a PNG.',
      'tooLarge',
    );
  }
  const { svg, width, height } = sanitiseSvg(text);
  return { mediaType: 'image/svg+xml', bytes: Buffer.from(svg, 'utf8'), width, height };
}

/**
 * What an uploaded file really is, judged by its content and not by its name: a picture that may be stored,
 * cleaned and with its natural size, or a sentence that says why it is none.
 */
export function inspectPicture(file: Uint8Array): PictureVerdict {
  try {
    const picture = read(Buffer.from(file.buffer, file.byteOffset, file.byteLength));
    const { width, height } = picture;
    if (width < 1 || height < 1 || width > MOST_PIXELS || height > MOST_PIXELS) {
      throw new UnusablePicture(
        `This picture is ${width} by ${height} pixels. Between 1 and ${MOST_PIXELS} each way can be used.`,
      );
    }
    return { usable: true, picture };
  } catch (error) {
    if (error instanceof UnusablePicture) return { usable: false, code: error.code, reason: error.message };
    throw error;
  }
}
