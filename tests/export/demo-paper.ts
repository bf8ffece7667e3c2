import { readFileSync } from 'node:fs';

import { demoItems } from '#server/db/seed/items/index.ts';
import { compileScript, evaluateDraw, firstKeptDraw, itemContentSchema } from '#shared/engine/index.ts';
import {
  buildPaperScheme,
  buildPaperSheet,
  type PaperFront,
  type PaperItem,
} from '#shared/sheet/build-paper.ts';

/** A bitmap of one pixel, so that the paper holds a picture of either kind. */
const DOT = Buffer.from(
  'iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAYAAAAfFcSJAAAADUlEQVR42mNk+M9QDwADhgGAWjR9awAAAABJRU5ErkJggg==',
  'base64',
);
const DOT_ID = 900;

/** Approved items of the demo, each at a draw of its own, with their figures. */
export function demoPaperItems(): PaperItem[] {
  let id = 0;
  return demoItems
    .filter((demo) => demo.life === 'approved')
    .map((demo, index) => {
      const figures = (demo.figures ?? []).map((figure) => ({
        ...figure,
        figureId: (id += 1),
        svg: readFileSync(new URL(`../../public/figures/${figure.file}`, import.meta.url), 'utf8'),
      }));
      const shown = figures.map(({ figureId, alternativeText }) => ({ figureId, alternativeText }));
      if (index === 1) shown.push({ figureId: DOT_ID, alternativeText: 'A single dot.' });
      const content = itemContentSchema.parse({ ...demo.content, practical: index === 0, figures: shown });
      const { script } = compileScript(content.script);
      if (script === null) throw new Error(`The script of ${content.title} does not compile.`);
      const draw = firstKeptDraw(script, Math.ceil(script.grid.size / 3));
      if (draw === null) throw new Error(`${content.title} keeps no draw.`);
      return {
        code: `${demo.topic}-${String(index + 1).padStart(3, '0')}`,
        content,
        script,
        values: evaluateDraw(script, draw),
        figures: [
          ...figures.map(({ figureId, svg }) => ({
            figureId,
            svg,
            mediaType: 'image/svg+xml' as const,
            width: 480,
            height: 230,
          })),
          { figureId: DOT_ID, svg: null, mediaType: 'image/png' as const, width: 40, height: 40 },
        ],
      };
    });
}

const FRONT: PaperFront = {
  organisation: 'Larkmoor Assessment Consortium',
  code: 'P-007',
  title: 'Charged particles and quanta',
  subtitle: 'Specimen paper',
  durationMinutes: 75,
  instructions: 'Answer all questions.\nGive each answer with its unit.',
  sealHash: null,
};

export const demoBitmaps = new Map([[DOT_ID, { bytes: new Uint8Array(DOT), mediaType: 'image/png' }]]);

/** Question paper and mark scheme of the same items; `sealHash` null makes a draft. */
export function demoPaper(sealHash: string | null) {
  const items = demoPaperItems();
  const front = { ...FRONT, sealHash };
  return { sheet: buildPaperSheet(front, items), scheme: buildPaperScheme(front, items) };
}
