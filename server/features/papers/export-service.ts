import type { ExportKind } from '#shared/contracts/papers.ts';
import { AppError } from '#shared/errors/app-error.ts';
import type { PaperScheme, PaperSheet } from '#shared/sheet/model.ts';

import type { AppContext } from '../../context.ts';
import { inTransaction } from '../../db/client.ts';
import { sha256 } from '../../db/columns.ts';
import { demand } from '../../http/demand.ts';
import { FileReply } from '../../http/file-reply.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { bitmapsOf, type StoredBitmap } from '../figures/stored-figures.ts';
import { assemble, requirePaper } from './assemble.ts';
import * as queries from './queries.ts';
import { openSeal, type SealedPaper, SHORT_HASH } from './seal.ts';
import { recordPaper } from './service.ts';

const DOCX = 'application/vnd.openxmlformats-officedocument.wordprocessingml.document';

interface PrintedPaper {
  sheet: PaperSheet;
  scheme: PaperScheme;
  bitmaps: Map<number, StoredBitmap>;
}

const broken = () =>
  new AppError(
    'notPossible',
    'What is stored of this paper is no longer what was sealed. Print nothing, and tell the administrator.',
  );

/** The pictures that were sealed; throws where one is gone or no longer has its hash. */
async function sealedBitmaps(context: AppContext, paper: SealedPaper): Promise<Map<number, StoredBitmap>> {
  const wanted = paper.items.flatMap((item) => item.bitmaps);
  const stored = await bitmapsOf(
    context.database,
    wanted.map(({ figureId }) => figureId),
  );
  for (const { figureId, sha256: hash } of wanted) {
    const bitmap = stored.get(figureId);
    if (bitmap === undefined || sha256(Buffer.from(bitmap.bytes)) !== hash) throw broken();
  }
  return stored;
}

/** What prints: the sealed content once there is a seal, else the paper as it stands, marked as a draft. */
async function printedPaper(context: AppContext, paperId: number): Promise<PrintedPaper> {
  const seal = await queries.selectSeal(context.database, paperId);
  if (seal === null) {
    const { places, built } = await assemble(context, paperId);
    const ids = places.flatMap((place) => place.content.figures.map((figure) => figure.figureId));
    return { sheet: built.sheet, scheme: built.scheme, bitmaps: await bitmapsOf(context.database, ids) };
  }
  const paper = openSeal(seal);
  if (paper === null) throw broken();
  const sealHash = seal.sha256.slice(0, SHORT_HASH);
  return {
    sheet: { ...paper.sheet, sealHash },
    scheme: { ...paper.scheme, sealHash },
    bitmaps: await sealedBitmaps(context, paper),
  };
}

/** Question paper and mark scheme for the preview on screen; each view is recorded. */
export async function paperSheet(context: AppContext, actor: SignedIn, paperId: number) {
  demand(actor, 'paper.read');
  const paper = await requirePaper(context.database, paperId);
  const { sheet, scheme } = await printedPaper(context, paperId);
  await inTransaction(context.database, (tx) => recordPaper(tx, actor, paper, 'paper.viewed', 'Read'));
  return { sheet, scheme };
}

const EXPORT_NAMES: Readonly<Record<ExportKind, string>> = {
  'question-paper': 'question paper',
  'mark-scheme': 'mark scheme',
};

/** One export as a Word file, written in a thread of its own; every export is recorded. */
export async function exportPaper(
  context: AppContext,
  actor: SignedIn,
  paperId: number,
  kind: ExportKind,
  signal: AbortSignal,
): Promise<FileReply> {
  demand(actor, 'paper.export');
  const paper = await requirePaper(context.database, paperId);
  const { sheet, scheme, bitmaps } = await printedPaper(context, paperId);
  const bytes = await context.exporter.export(
    kind === 'question-paper' ? { kind, sheet, bitmaps } : { kind, scheme },
    { signal },
  );
  const mark = sheet.sealHash ?? 'draft';
  await inTransaction(context.database, (tx) =>
    recordPaper(tx, actor, paper, 'paper.exported', `Exported the ${EXPORT_NAMES[kind]} (${mark}) of`),
  );
  return new FileReply(bytes, DOCX, { fileName: `${paper.code}-${kind}-${mark}.docx` });
}
