import { exportMarkScheme } from '../export/mark-scheme.ts';
import { exportQuestionPaper } from '../export/question-paper.ts';
import { dispatcher } from './dispatcher.ts';
import type { ExportRequest } from './exporter.ts';

/** What the exporter's thread can be asked for. */
export default dispatcher({
  export: (request: ExportRequest) =>
    request.kind === 'question-paper'
      ? exportQuestionPaper(request.sheet, request.bitmaps)
      : exportMarkScheme(request.scheme),
});
