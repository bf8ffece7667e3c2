import type { Paper, PaperDetails } from '#shared/contracts/papers.ts';
import { itemContentSchema } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../../context.ts';
import { type Connection, inTransaction, type Transaction } from '../../db/client.ts';
import { takeNumber } from '../../db/take-number.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { tellingCurrent } from '../../http/telling-current.ts';
import { recordEvent } from '../records/record-event.ts';
import { assemble, type AssembledPaper, buildPlaces, requirePaper } from './assemble.ts';
import { chooseDraws } from './choose-draws.ts';
import { nextPaperState } from './next-state.ts';
import { findInPaper } from './paper-findings.ts';
import { presentPaper, presentPaperRow } from './present.ts';
import * as queries from './queries.ts';

export async function listPapers(context: AppContext) {
  return { papers: (await queries.selectPapers(context.database)).map(presentPaperRow) };
}

/** The paper's own findings at this moment. */
export async function findingsOf(connection: Connection, { paper, places, built }: AssembledPaper) {
  const otherUses = await queries.selectOtherUses(
    connection,
    paper.id,
    places.map((place) => place.itemId),
  );
  return findInPaper({ paper, places, built, otherUses });
}

/** The whole paper as this person may see it. */
export async function loadPaper(context: AppContext, actor: SignedIn, paperId: number): Promise<Paper> {
  demand(actor, 'paper.read');
  const { database } = context;
  const assembled = await assemble(context, paperId);
  const sealed = assembled.paper.state === 'sealed' || assembled.paper.state === 'released';
  return presentPaper({
    ...assembled,
    findings: sealed ? [] : await findingsOf(database, assembled),
    seal: await queries.selectSeal(database, paperId),
    actor,
  });
}

/** The paper, and the fact that this person looked at it. */
export async function viewPaper(context: AppContext, actor: SignedIn, paperId: number): Promise<Paper> {
  const paper = await loadPaper(context, actor, paperId);
  await inTransaction(context.database, (tx) => recordPaper(tx, actor, paper, 'paper.viewed', 'Looked at'));
  return paper;
}

/** Records what a person did with a paper; `did` begins the sentence that its code ends. */
export async function recordPaper(
  tx: Transaction,
  actor: SignedIn,
  paper: { id: number; code: string },
  event: string,
  did: string,
  change: { before?: unknown; after?: unknown } = {},
): Promise<void> {
  await recordEvent(tx, {
    event,
    actor,
    subjectType: 'paper',
    subjectId: paper.id,
    summary: `${did} ${paper.code}.`,
    ...change,
  });
}

export async function createPaper(
  context: AppContext,
  actor: SignedIn,
  details: PaperDetails,
): Promise<Paper> {
  const paperId = await inTransaction(context.database, async (tx) => {
    demand(actor, 'paper.create');
    const code = `P-${String(await takeNumber(tx, 'paper')).padStart(3, '0')}`;
    const id = await queries.insertPaper(tx, { ...details, code, createdById: actor.id });
    await recordPaper(tx, actor, { id, code }, 'paper.created', 'Began');
    return id;
  });
  return loadPaper(context, actor, paperId);
}

/** Insists that the paper is the one that the person looked at; throws AppError conflict. */
export function demandVersion(paper: queries.PaperRecord, version: number): void {
  if (paper.version !== version) {
    throw new AppError('conflict', 'Somebody else changed this paper since you opened it. Compare the two.');
  }
}

/**
 * Runs `work` with the paper locked at `version`, then gives the paper as it is now. Throws AppError conflict,
 * with the paper as stored, when the version is stale.
 */
export async function changePaper(
  context: AppContext,
  actor: SignedIn,
  paperId: number,
  version: number,
  work: (tx: Transaction, paper: queries.PaperRecord) => Promise<void>,
): Promise<Paper> {
  const current = () => loadPaper(context, actor, paperId);
  await tellingCurrent(
    () =>
      inTransaction(context.database, async (tx) => {
        const paper = await requirePaper(tx, paperId, true);
        demandVersion(paper, version);
        await work(tx, paper);
      }),
    current,
  );
  return current();
}

export function saveDetails(
  context: AppContext,
  actor: SignedIn,
  paperId: number,
  { version, ...details }: PaperDetails & { version: number },
): Promise<Paper> {
  demand(actor, 'paper.edit');
  return changePaper(context, actor, paperId, version, async (tx, paper) => {
    const { event } = nextPaperState(paper.state, { kind: 'edit' });
    await queries.updatePaper(tx, paperId, context.clock(), details);
    await recordPaper(tx, actor, paper, event, 'Changed the details of');
  });
}

interface WantedPlace {
  itemId: number;
  draw: number | null;
  takeNewest: boolean;
}

/** The revision that each item brings: the one taken before, or the newest approved one. */
async function revisionsFor(
  context: AppContext,
  current: readonly queries.PlaceRecord[],
  wanted: readonly WantedPlace[],
) {
  const ids = wanted.map((place) => place.itemId);
  const approved = await queries.selectApproved(context.database, ids);
  return wanted.map((place, index) => {
    if (ids.indexOf(place.itemId) !== index) {
      throw new AppError('invalid', 'An item can stand on a paper only once.', {
        fields: [{ path: `places.${index}.itemId`, message: 'This item stands on the paper already.' }],
      });
    }
    const standing = current.find((candidate) => candidate.itemId === place.itemId);
    const taken = standing === undefined || place.takeNewest ? approved.get(place.itemId) : standing;
    if (taken === undefined) {
      throw new AppError('invalid', `The item in place ${index + 1} has no approved revision.`, {
        fields: [{ path: `places.${index}.itemId`, message: 'Only approved items can stand on a paper.' }],
      });
    }
    return {
      itemId: place.itemId,
      revisionId: taken.revisionId,
      code: taken.itemCode,
      content: itemContentSchema.parse(taken.content),
      draw: place.draw,
    };
  });
}

/**
 * Puts the items in this order. Items that are new on the paper bring their approved revision; the others keep
 * theirs unless the newest is asked for. Where no draw is given the server chooses one by chance.
 */
export async function savePlaces(
  context: AppContext,
  actor: SignedIn,
  paperId: number,
  wanted: { version: number; places: readonly WantedPlace[] },
): Promise<Paper> {
  demand(actor, 'paper.edit');
  const before = await requirePaper(context.database, paperId);
  // Said before any work is done; asked again below with the paper locked.
  await tellingCurrent(
    async () => demandVersion(before, wanted.version),
    () => loadPaper(context, actor, paperId),
  );
  const { event } = nextPaperState(before.state, { kind: 'edit' });
  const current = await queries.selectPlaces(context.database, paperId);
  const taken = await revisionsFor(context, current, wanted.places);
  const used = new Map<number, Set<number>>();
  const ids = taken.map((place) => place.itemId);
  for (const use of await queries.selectOtherUses(context.database, paperId, ids)) {
    used.set(use.itemId, (used.get(use.itemId) ?? new Set()).add(use.draw));
  }
  const draws = await chooseDraws(context, taken, used, (chosen) =>
    buildPlaces(
      context,
      before,
      taken.map((place, index) => ({
        itemCode: place.code,
        content: place.content,
        draw: chosen[index] ?? 1,
      })),
    ),
  );
  const places = taken.map(({ itemId, revisionId }, index) => ({
    itemId,
    revisionId,
    draw: draws[index] ?? 1,
  }));
  return changePaper(context, actor, paperId, wanted.version, async (tx, paper) => {
    await queries.replacePlaces(tx, paperId, places);
    await queries.updatePaper(tx, paperId, context.clock(), {});
    await recordPaper(tx, actor, paper, event, 'Changed the running order of', {
      before: { places: current.map(({ itemId, revisionId, draw }) => ({ itemId, revisionId, draw })) },
      after: { places },
    });
  });
}
