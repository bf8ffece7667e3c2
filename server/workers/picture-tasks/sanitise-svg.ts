import createDOMPurify from 'dompurify';
import { JSDOM } from 'jsdom';

import { UnusablePicture } from './unusable-picture.ts';

const PROLOGUE = /^\s*(<\?xml[^>]*>\s*)?(<!--[\s\S]*?-->\s*|<!DOCTYPE svg[^>[]*>\s*)*<svg[\s>/]/i;

/** Whether a text begins as an SVG document; an internal document type (entities) is not taken. */
export function isSvgText(text: string): boolean {
  return PROLOGUE.test(text.slice(0, 8_000));
}

const LENGTH = /^\s*(\d+(?:\.\d+)?|\.\d+)\s*(?:px)?\s*$/;

function sizeOf(root: Element): { width: number; height: number } {
  const [, , boxWidth = NaN, boxHeight = NaN] = (root.getAttribute('viewBox') ?? '')
    .trim()
    .split(/[\s,]+/)
    .map(Number);
  const width = Number(LENGTH.exec(root.getAttribute('width') ?? '')?.[1] ?? boxWidth);
  const height = Number(LENGTH.exec(root.getAttribute('height') ?? '')?.[1] ?? boxHeight);
  if (!(width > 0) || !(height > 0)) {
    throw new UnusablePicture('This SVG has no size. Give it a viewBox, or a width and a height in pixels.');
  }
  return { width, height };
}

/** An address within the picture itself; every other one is dropped. */
const POINTS_WITHIN = /^#[\w-]+$/;
const POINTS_OUT = /url\(\s*['"]?(?!\s*#)/i;
/** What lets a style load or hide something: escapes, at-rules, comments and functions other than colours. */
const UNSAFE_STYLE = /[\\@<]|\/\*|expression|image-set|src\(/i;

function keeps(attribute: string, value: string): boolean {
  if (attribute === 'href' || attribute === 'xlink:href' || attribute === 'src') {
    return POINTS_WITHIN.test(value.trim());
  }
  if (POINTS_OUT.test(value)) return false;
  return attribute !== 'style' || !UNSAFE_STYLE.test(value);
}

/**
 * Cleans an SVG: no scripts, style sheets, embedded pictures, foreign content, links, animation or event
 * handlers, and no address but one within the picture. Gives the cleaned text and the natural size in user
 * units; throws UnusablePicture when nothing that can be shown is left.
 */
export function sanitiseSvg(text: string): { svg: string; width: number; height: number } {
  const { window } = new JSDOM('');
  try {
    const purifier = createDOMPurify(window);
    purifier.addHook('uponSanitizeAttribute', (_node, data) => {
      if (!keeps(data.attrName, data.attrValue)) data.keepAttr = false;
    });
    const clean = purifier.sanitize(text, {
      USE_PROFILES: { svg: true, svgFilters: true },
      FORBID_TAGS: ['style', 'image', 'a', 'script', 'foreignObject', 'feImage', 'animate', 'set'],
      ALLOW_DATA_ATTR: false,
    });
    const root = new window.DOMParser().parseFromString(clean, 'text/html').querySelector('svg');
    if (root === null || root.childElementCount === 0) {
      throw new UnusablePicture('This SVG shows nothing that can be printed. Draw it with shapes and text.');
    }
    if (!root.hasAttribute('xmlns')) root.setAttribute('xmlns', 'http://www.w3.org/2000/svg');
    return { svg: new window.XMLSerializer().serializeToString(root), ...sizeOf(root) };
  } finally {
    window.close();
  }
}
