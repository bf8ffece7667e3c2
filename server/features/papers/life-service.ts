import type { Paper } from '#shared/contracts/papers.ts';
import { ENGINE_VERSION } from '#shared/engine/index.ts';

import type { AppContext } from '../../context.ts';
import type { Transaction } from '../../db/client.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { queueMail } from '../../jobs/queue-mail.ts';
import { bitmapsOf } from '../figures/stored-figures.ts';
import { peopleInRoles, personById } from '../people/service.ts';
import { assemble, type AssembledPaper } from './assemble.ts';
import { nextPaperState } from './next-state.ts';
import * as queries from './queries.ts';
import { type SealedPaper, sealText } from './seal.ts';
import { changePaper, demandVersion, findingsOf, recordPaper } from './service.ts';

/** The paper as assembled before the transaction, with the states of its items as they are within it. */
async function assembledNow(
  tx: Transaction,
  paper: queries.PaperRecord,
  assembled: AssembledPaper,
): Promise<AssembledPaper> {
  // Places change only with the version, and a revision that a paper holds never changes.
  demandVersion(assembled.paper, paper.version);
  return { paper, places: await queries.selectPlaces(tx, paper.id), built: assembled.built };
}

async function blockersOf(tx: Transaction, assembled: AssembledPaper): Promise<number> {
  return (await findingsOf(tx, assembled)).filter((finding) => finding.severity === 'blocker').length;
}

/** Offers the paper for sealing; its own blockers refuse it. Those who can confirm it get a letter. */
export async function proposePaper(
  context: AppContext,
  actor: SignedIn,
  paperId: number,
  version: number,
): Promise<Paper> {
  demand(actor, 'paper.propose');
  const before = await assemble(context, paperId);
  return changePaper(context, actor, paperId, version, async (tx, paper) => {
    const assembled = await assembledNow(tx, paper, before);
    const { state, event } = nextPaperState(paper.state, {
      kind: 'propose',
      places: assembled.places.length,
      blockers: await blockersOf(tx, assembled),
    });
    const at = context.clock();
    await queries.updatePaper(tx, paperId, at, { state, proposedById: actor.id, proposedAt: at });
    const confirmers = await peopleInRoles(tx, ['setter', 'moderator']);
    for (const person of confirmers.filter(({ id }) => id !== actor.id)) {
      await queueMail(tx, {
        kind: 'paperProposed',
        person,
        payload: { paperId, paperCode: paper.code, proposedBy: actor.name },
        dedupeKey: `paperProposed:${paperId}:${paper.version}:${person.id}`,
      });
    }
    await recordPaper(tx, actor, paper, event, 'Proposed');
  });
}

/** Takes a proposed paper back to assembling, with a reason. */
export function returnPaper(
  context: AppContext,
  actor: SignedIn,
  paperId: number,
  { version, reason }: { version: number; reason: string },
): Promise<Paper> {
  demand(actor, 'paper.return');
  return changePaper(context, actor, paperId, version, async (tx, paper) => {
    const { state, event } = nextPaperState(paper.state, { kind: 'return' });
    await queries.updatePaper(tx, paperId, context.clock(), { state, proposedById: null, proposedAt: null });
    await recordPaper(tx, actor, paper, event, 'Returned to assembling', { after: { reason } });
  });
}

/** Everything that the seal freezes. */
async function sealedContent(tx: Transaction, { places, built }: AssembledPaper): Promise<SealedPaper> {
  const bitmaps = await bitmapsOf(
    tx,
    places.flatMap((place) => place.content.figures.map((figure) => figure.figureId)),
  );
  return {
    form: 1,
    engineVersion: ENGINE_VERSION,
    sheet: built.sheet,
    scheme: built.scheme,
    items: places.map(({ itemCode, revision, draw, content }, index) => ({
      code: itemCode,
      revision,
      draw,
      content,
      bands: (built.facts[index]?.answers ?? []).map(({ partId, answerSI, fromSI, toSI }) => ({
        partId,
        answerSI,
        fromSI,
        toSI,
      })),
      bitmaps: content.figures.flatMap(({ figureId }) => {
        const bitmap = bitmaps.get(figureId);
        return bitmap === undefined ? [] : [{ figureId, sha256: bitmap.sha256 }];
      }),
    })),
  };
}

/** The second person's confirmation: freezes all that prints and hashes it. */
export async function sealPaper(
  context: AppContext,
  actor: SignedIn,
  paperId: number,
  version: number,
): Promise<Paper> {
  const before = await assemble(context, paperId);
  demand(actor, 'paper.seal', { proposedById: before.paper.proposedById });
  return changePaper(context, actor, paperId, version, async (tx, paper) => {
    demand(actor, 'paper.seal', { proposedById: paper.proposedById });
    const assembled = await assembledNow(tx, paper, before);
    const { state, event } = nextPaperState(paper.state, {
      kind: 'seal',
      blockers: await blockersOf(tx, assembled),
    });
    if (paper.proposedById === null) throw new Error('A proposed paper has no proposer.');
    const { canonical, hash } = sealText(await sealedContent(tx, { ...assembled, places: before.places }));
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
    await queueMail(tx, {
      kind: 'paperSealed',
      person: await personById(tx, paper.proposedById),
      payload: { paperId, paperCode: paper.code, confirmedBy: actor.name },
      dedupeKey: `paperSealed:${paperId}`,
    });
    await recordPaper(tx, actor, paper, event, 'Sealed', { after: { sha256: hash } });
  });
}

/** Ends the confidentiality of a sealed paper. */
export function releasePaper(
  context: AppContext,
  actor: SignedIn,
  paperId: number,
  version: number,
): Promise<Paper> {
  demand(actor, 'paper.release');
  return changePaper(context, actor, paperId, version, async (tx, paper) => {
    const { state, event } = nextPaperState(paper.state, { kind: 'release' });
    const at = context.clock();
    await queries.updatePaper(tx, paperId, at, { state, releasedAt: at });
    await recordPaper(tx, actor, paper, event, 'Released');
  });
}
