import createDOMPurify from 'dompurify';
import { JSDOM } from 'jsdom';

import { FIGURE_MAX_BYTES, type FIGURE_TYPES } from '#shared/contracts/figures.ts';
import { AppError } from '#shared/errors/app-error.ts';

/** A picture that may be stored: what it is by its content, cleaned, with its natural size. */
export interface InspectedPicture {
  mediaType: (typeof FIGURE_TYPES)[number];
  bytes: Buffer;
  width: number;
  height: number;
}

const PNG_START = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
/** Pictures larger than this in either direction would not help a reader, and would burden every export. */
const MOST_PIXELS = 8_000;

const refuse = (message: string) => new AppError('unsupportedFile', message);

function pngSize(bytes: Buffer): { width: number; height: number } {
  if (
    bytes.length < 33 ||
    bytes.toString('latin1', 12, 16) !== 'IHDR' ||
    !bytes.includes('IEND', 16, 'latin1')
  ) {
    throw refuse('This PNG is damaged. Save the picture again and choose the new file.');
  }
  return { width: bytes.readUInt32BE(16), height: bytes.readUInt32BE(20) };
}

/** Walks the segments of a JPEG to the frame header, which holds the size. */
function jpegSize(bytes: Buffer): { width: number; height: number } {
  let at = 2;
  while (at + 9 < bytes.length && bytes[at] === 0xff) {
    const marker = bytes[at + 1] ?? 0;
    const isFrame = marker >= 0xc0 && marker <= 0xcf && ![0xc4, 0xc8, 0xcc].includes(marker);
    if (isFrame) return { height: bytes.readUInt16BE(at + 5), width: bytes.readUInt16BE(at + 7) };
    at += 2 + bytes.readUInt16BE(at + 2);
  }
  throw refuse('This JPEG is damaged. Save the picture again and choose the new file.');
}

const LENGTH = /^\s*([\d.]+)\s*(px)?\s*$/;

function svgSize(root: Element): { width: number; height: number } {
  const viewBox = (root.getAttribute('viewBox') ?? '')
    .trim()
    .split(/[\s,]+/)
    .map(Number);
  const [, , boxWidth = NaN, boxHeight = NaN] = viewBox;
  const width = Number(LENGTH.exec(root.getAttribute('width') ?? '')?.[1] ?? boxWidth);
  const height = Number(LENGTH.exec(root.getAttribute('height') ?? '')?.[1] ?? boxHeight);
  if (!(width > 0) || !(height > 0)) {
    throw refuse('This SVG has no size. Give it a viewBox, or a width and a height.');
  }
  return { width, height };
}

/**
 * Cleans an SVG: no scripts, styles, embedded pictures, foreign content, event handlers or outside links; only
 * references within the picture itself are left.
 */
export function sanitiseSvg(text: string): { svg: string; width: number; height: number } {
  const { window } = new JSDOM('');
  const purifier = createDOMPurify(window);
  const removedLinks = /^(?!#)/;
  purifier.addHook('uponSanitizeAttribute', (_node, data) => {
    const isLink = data.attrName === 'href' || data.attrName === 'xlink:href' || data.attrName === 'src';
    const pointsOut = /url\(\s*['"]?(?!#)/i.test(data.attrValue);
    if ((isLink && removedLinks.test(data.attrValue.trim())) || pointsOut) data.keepAttr = false;
  });
  const clean = purifier.sanitize(text, {
    USE_PROFILES: { svg: true, svgFilters: true },
    FORBID_TAGS: ['style', 'image', 'a', 'script', 'foreignObject', 'feImage', 'animate', 'set'],
    FORBID_ATTR: ['style'],
    ALLOW_DATA_ATTR: false,
  });
  const parsed = new window.DOMParser().parseFromString(clean, 'text/html').querySelector('svg');
  window.close();
  if (parsed === null) throw refuse('This file holds no SVG picture.');
  if (!parsed.hasAttribute('xmlns')) parsed.setAttribute('xmlns', 'http://www.w3.org/2000/svg');
  const size = svgSize(parsed);
  const serialised = new window.XMLSerializer().serializeToString(parsed);
  return { svg: serialised, ...size };
}

/** What an uploaded file really is, whatever its name. Throws AppError unsupportedFile or tooLarge. */
export function inspectPicture(bytes: Buffer): InspectedPicture {
  if (bytes.length > FIGURE_MAX_BYTES) throw new AppError('tooLarge', 'A figure may have at most 4 MB.');
  if (bytes.subarray(0, 8).equals(PNG_START))
    return bounded({ mediaType: 'image/png', bytes, ...pngSize(bytes) });
  if (bytes[0] === 0xff && bytes[1] === 0xd8 && bytes[2] === 0xff) {
    return bounded({ mediaType: 'image/jpeg', bytes, ...jpegSize(bytes) });
  }
  const start = bytes
    .toString('utf8', 0, 2_000)
    .replace(/^\uFEFF/, '')
    .trimStart();
  if (/^(<\?xml[^>]*>\s*)?(<!--[\s\S]*?-->\s*)*(<!DOCTYPE svg[^>]*>\s*)?<svg[\s>]/i.test(start)) {
    const { svg, width, height } = sanitiseSvg(bytes.toString('utf8').replace(/^\uFEFF/, ''));
    return { mediaType: 'image/svg+xml', bytes: Buffer.from(svg, 'utf8'), width, height };
  }
  throw refuse('This file is no picture that can be printed. Choose a PNG, a JPEG or an SVG.');
}

function bounded(picture: InspectedPicture): InspectedPicture {
  if (
    picture.width < 1 ||
    picture.height < 1 ||
    picture.width > MOST_PIXELS ||
    picture.height > MOST_PIXELS
  ) {
    throw refuse(
      `This picture is ${picture.width} by ${picture.height} pixels. At most ${MOST_PIXELS} each way can be used.`,
    );
  }
  return picture;
}
