import { assayItem, type AssayReport, type FigureFacts, type ItemContent } from '#shared/engine/index.ts';

/** The full check of one item's content. */
export function assay({
  content,
  figures,
}: {
  content: ItemContent;
  figures: readonly FigureFacts[];
}): AssayReport {
  return assayItem(content, { figures }).report;
}
