import type { Paper } from '#shared/contracts/papers.ts';
import { itemContentSchema } from '#shared/engine/index.ts';

import type { AppContext } from '../../context.ts';
import { inTransaction } from '../../db/client.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { bitmapsOf } from '../figures/stored-figures.ts';
import { recordEvent } from '../records/record-event.ts';
import { nextPaperState } from './next-state.ts';
import * as queries from './queries.ts';
import { type SealedPaper, sealText } from './seal.ts';
import { assemble, type AssembledPaper, findingsOf, loadPaper, lockVersion, recordView } from './service.ts';

const blockersIn = (findings: readonly { severity: string }[]) =>
  findings.filter((finding) => finding.severity === 'blocker').length;

/** Offers the paper for sealing; its own blockers refuse it. */
export async function proposePaper(
  context: AppContext,
  actor: SignedIn,
  paperId: number,
  version: number,
): Promise<Paper> {
  await inTransaction(context.database, async (tx) => {
    demand(actor, 'paper.propose');
    const paper = await lockVersion(context, tx, actor, paperId, version);
    const assembled = await assemble(context, tx, paperId);
    const { state, event } = nextPaperState(paper.state, {
      kind: 'propose',
      places: assembled.places.length,
      blockers: blockersIn(await findingsOf(tx, assembled)),
    });
    const at = context.clock();
    await queries.updatePaper(tx, paperId, at, { state, proposedById: actor.id, proposedAt: at });
    await recordView(tx, actor, paper, event, 'Proposed');
  });
  return loadPaper(context, context.database, actor, paperId);
}

/** Takes a proposed paper back to assembling, with a reason. */
export async function returnPaper(
  context: AppContext,
  actor: SignedIn,
  paperId: number,
  { version, reason }: { version: number; reason: string },
): Promise<Paper> {
  await inTransaction(context.database, async (tx) => {
    demand(actor, 'paper.return');
    const paper = await lockVersion(context, tx, actor, paperId, version);
    const { state, event } = nextPaperState(paper.state, { kind: 'return' });
    await queries.updatePaper(tx, paperId, context.clock(), { state, proposedById: null, proposedAt: null });
    await recordEvent(tx, {
      event,
      actor,
      subjectType: 'paper',
      subjectId: paperId,
      summary: `Returned ${paper.code} to assembling.`,
      after: { reason },
    });
  });
  return loadPaper(context, context.database, actor, paperId);
}

/** Everything that the seal freezes, bitmaps included. */
async function sealedContent(
  connection: Parameters<typeof bitmapsOf>[0],
  { places, built }: AssembledPaper,
): Promise<SealedPaper> {
  const items: SealedPaper['items'] = [];
  for (const place of places) {
    const content = itemContentSchema.parse(place.content);
    const bytes = await bitmapsOf(
      connection,
      content.figures.map((figure) => figure.figureId),
    );
    items.push({
      code: place.itemCode,
      revision: place.revision,
      draw: place.draw,
      content,
      figures: [...bytes]
        .filter(([, { mediaType }]) => mediaType !== 'image/svg+xml')
        .map(([figureId, { bytes: picture, mediaType }]) => ({
          figureId,
          mediaType,
          base64: Buffer.from(picture).toString('base64'),
        })),
    });
  }
  return { form: 1, sheet: built.sheet, scheme: built.scheme, items };
}

/** The second person's confirmation: freezes all that prints and hashes it. */
export async function sealPaper(
  context: AppContext,
  actor: SignedIn,
  paperId: number,
  version: number,
): Promise<Paper> {
  await inTransaction(context.database, async (tx) => {
    const paper = await lockVersion(context, tx, actor, paperId, version);
    demand(actor, 'paper.seal', { proposedById: paper.proposedById });
    const assembled = await assemble(context, tx, paperId);
    const { state, event } = nextPaperState(paper.state, {
      kind: 'seal',
      blockers: blockersIn(await findingsOf(tx, assembled)),
    });
    if (paper.proposedById === null) throw new Error('A proposed paper has no proposer.');
    const { canonical, hash } = sealText(await sealedContent(tx, assembled));
    const at = context.clock();
    await queries.insertSeal(tx, {
      paperId,
      canonical,
      sha256: hash,
      proposedById: paper.proposedById,
      confirmedById: actor.id,
      sealedAt: at,
    });
    await queries.updatePaper(tx, paperId, at, { state });
    await recordEvent(tx, {
      event,
      actor,
      subjectType: 'paper',
      subjectId: paperId,
      summary: `Sealed ${paper.code}.`,
      after: { sha256: hash },
    });
  });
  return loadPaper(context, context.database, actor, paperId);
}

/** Ends the confidentiality of a sealed paper. */
export async function releasePaper(
  context: AppContext,
  actor: SignedIn,
  paperId: number,
  version: number,
): Promise<Paper> {
  await inTransaction(context.database, async (tx) => {
    demand(actor, 'paper.release');
    const paper = await lockVersion(context, tx, actor, paperId, version);
    const { state, event } = nextPaperState(paper.state, { kind: 'release' });
    const at = context.clock();
    await queries.updatePaper(tx, paperId, at, { state, releasedAt: at });
    await recordView(tx, actor, paper, event, 'Released');
  });
  return loadPaper(context, context.database, actor, paperId);
}
