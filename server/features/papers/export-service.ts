import type { ExportKind } from '#shared/contracts/papers.ts';
import { AppError } from '#shared/errors/app-error.ts';
import type { PaperScheme, PaperSheet } from '#shared/sheet/model.ts';

import type { AppContext } from '../../context.ts';
import { inTransaction } from '../../db/client.ts';
import type { Bitmaps } from '../../export/bitmaps.ts';
import { demand } from '../../http/demand.ts';
import { FileReply } from '../../http/file-reply.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { bitmapsOf } from '../figures/stored-figures.ts';
import * as queries from './queries.ts';
import { openSeal, SHORT_HASH } from './seal.ts';
import { assemble, recordView, requirePaper } from './service.ts';

const DOCX = 'application/vnd.openxmlformats-officedocument.wordprocessingml.document';

interface PrintedPaper {
  sheet: PaperSheet;
  scheme: PaperScheme;
  bitmaps: Bitmaps;
}

/** What prints: the sealed content once there is a seal, else the paper as it stands, marked as a draft. */
async function printedPaper(context: AppContext, paperId: number): Promise<PrintedPaper> {
  const seal = await queries.selectSeal(context.database, paperId);
  if (seal === null) {
    const { places, built } = await assemble(context, context.database, paperId);
    const ids = places.flatMap((place) => place.content.figures.map((figure) => figure.figureId));
    return { sheet: built.sheet, scheme: built.scheme, bitmaps: await bitmapsOf(context.database, ids) };
  }
  const { paper, intact } = openSeal(seal.canonical, seal.sha256);
  if (!intact) {
    throw new AppError(
      'notPossible',
      'The sealed content no longer has the hash that was sealed. Tell the administrator before anything is printed.',
    );
  }
  const sealHash = seal.sha256.slice(0, SHORT_HASH);
  const bitmaps: Bitmaps = new Map(
    paper.items.flatMap((item) =>
      item.figures.map(({ figureId, mediaType, base64 }) => [
        figureId,
        { mediaType, bytes: new Uint8Array(Buffer.from(base64, 'base64')) },
      ]),
    ),
  );
  return { sheet: { ...paper.sheet, sealHash }, scheme: { ...paper.scheme, sealHash }, bitmaps };
}

/** Question paper and mark scheme for the preview on screen. */
export async function paperSheet(context: AppContext, actor: SignedIn, paperId: number) {
  demand(actor, 'paper.read');
  const paper = await requirePaper(context.database, paperId);
  const { sheet, scheme } = await printedPaper(context, paperId);
  await inTransaction(context.database, (tx) => recordView(tx, actor, paper, 'paper.viewed', 'Read'));
  return { sheet, scheme };
}

const EXPORT_NAMES: Readonly<Record<ExportKind, string>> = {
  'question-paper': 'question paper',
  'mark-scheme': 'mark scheme',
};

/** One export as a Word file; every export is recorded. */
export async function exportPaper(
  context: AppContext,
  actor: SignedIn,
  paperId: number,
  kind: ExportKind,
): Promise<FileReply> {
  demand(actor, 'paper.export');
  const paper = await requirePaper(context.database, paperId);
  const { sheet, scheme, bitmaps } = await printedPaper(context, paperId);
  const bytes = await context.exporter.export(
    kind === 'question-paper' ? { kind, sheet, bitmaps } : { kind, scheme },
  );
  await inTransaction(context.database, (tx) =>
    recordView(tx, actor, paper, 'paper.exported', `Exported the ${EXPORT_NAMES[kind]} of`),
  );
  const mark = sheet.sealHash ?? 'draft';
  return new FileReply(bytes, DOCX, {
    fileName: `${paper.code}-${kind}-${mark}.docx`,
    headers: { 'cache-control': 'no-store' },
  });
}
