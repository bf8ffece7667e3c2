import { type AssayReport, assayItem } from '#shared/engine/index.ts';

import { dispatcher } from './dispatcher.ts';
import { buildPaper, chooseDraw } from './engine-tasks/build-paper.ts';
import { cautionsOf } from './engine-tasks/cautions-of.ts';
import { markWorking } from './engine-tasks/mark-working.ts';
import { viewDraw } from './engine-tasks/view-draw.ts';
import type { ContentToAssay } from './task-types.ts';

function assay({ content, figures }: ContentToAssay): AssayReport {
  return assayItem(content, { figures }).report;
}

/** What the engine's threads can be asked for. */
export default dispatcher({ assay, buildPaper, cautionsOf, chooseDraw, markWorking, viewDraw });
