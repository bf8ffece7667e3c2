import { dispatcher } from './dispatcher.ts';
import { buildPaper, chooseDraw } from './engine-tasks/build-paper.ts';
import { markWorking } from './engine-tasks/mark-working.ts';
import { viewDraw } from './engine-tasks/view-draw.ts';

/** What the engine's threads can be asked for. */
export default dispatcher({ buildPaper, chooseDraw, markWorking, viewDraw });
