import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';

import { Resvg } from '@resvg/resvg-js';
import { AlignmentType, ImageRun, Paragraph } from 'docx';

import type { SheetFigure } from '#shared/sheet/model.ts';

import type { Bitmaps } from './bitmaps.ts';
import { TEXT_PIXELS } from './styles.ts';

/** The fallback picture is made at this many pixels for each pixel on the page, so that it prints sharply. */
const SHARPNESS = 3;

const fontFolder = join(
  dirname(createRequire(import.meta.url).resolve('@expo-google-fonts/literata/package.json')),
);
const fontFiles = [
  join(fontFolder, '400Regular', 'Literata_400Regular.ttf'),
  join(fontFolder, '400Regular_Italic', 'Literata_400Regular_Italic.ttf'),
];

/** An SVG as PNG bytes, `width` pixels wide. Throws when the SVG cannot be read. */
export function svgToPng(svg: string, width: number): Uint8Array {
  const renderer = new Resvg(svg, {
    fitTo: { mode: 'width', value: Math.round(width) },
    font: { fontFiles, loadSystemFonts: false, defaultFontFamily: 'Literata', serifFamily: 'Literata' },
    background: 'white',
  });
  return renderer.render().asPng();
}

function image(figure: SheetFigure, bitmaps: Bitmaps, id: number): ImageRun | null {
  const width = Math.round((TEXT_PIXELS * figure.widthPercent) / 100);
  const height = Math.round((width * figure.height) / figure.width);
  const common = {
    transformation: { width, height },
    altText: {
      id: String(id),
      name: `Figure ${id}`,
      title: figure.caption,
      description: figure.alternativeText,
    },
  };
  if (figure.svg !== null) {
    return new ImageRun({
      ...common,
      type: 'svg',
      data: Buffer.from(figure.svg, 'utf8'),
      fallback: { type: 'png', data: Buffer.from(svgToPng(figure.svg, width * SHARPNESS)) },
    });
  }
  const bitmap = bitmaps.get(figure.figureId);
  if (bitmap === undefined) return null;
  return new ImageRun({
    ...common,
    type: bitmap.mediaType === 'image/png' ? 'png' : 'jpg',
    data: Buffer.from(bitmap.bytes),
  });
}

/** A figure with its caption, centred; numbered `id` within the document. */
export function figureParagraphs(figure: SheetFigure, bitmaps: Bitmaps, id: number): Paragraph[] {
  const run = image(figure, bitmaps, id);
  if (run === null) return [];
  const picture = new Paragraph({
    alignment: AlignmentType.CENTER,
    spacing: { before: 120, after: 120 },
    keepNext: figure.caption !== '',
    children: [run],
  });
  if (figure.caption === '') return [picture];
  return [picture, new Paragraph({ style: 'FigureCaption', text: figure.caption })];
}
