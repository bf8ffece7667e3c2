import type { Paper, PaperDetails } from '#shared/contracts/papers.ts';
import { itemContentSchema } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { AppContext } from '../../context.ts';
import { type Connection, inTransaction, type Transaction } from '../../db/client.ts';
import { takeNumber } from '../../db/take-number.ts';
import { demand } from '../../http/demand.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import { storedFigures } from '../figures/stored-figures.ts';
import { recordEvent } from '../records/record-event.ts';
import type { BuiltPaper } from '../../workers/task-types.ts';
import { nextPaperState } from './next-state.ts';
import { findInPaper } from './paper-findings.ts';
import { presentPaper, presentPaperRow } from './present.ts';
import * as queries from './queries.ts';

/** The paper's row; throws AppError notFound. */
export async function requirePaper(
  connection: Connection,
  paperId: number,
  lock = false,
): Promise<queries.PaperRecord> {
  const paper = await queries.selectPaper(connection, paperId, lock);
  if (paper === null) throw new AppError('notFound', 'There is no such paper.');
  return paper;
}

export async function listPapers(context: AppContext) {
  const rows = await queries.selectPapers(context.database);
  const idsOf = (row: (typeof rows)[number]) => row.revisionIds?.split(',').map(Number) ?? [];
  const marks = await queries.selectMarks(context.database, [...new Set(rows.flatMap(idsOf))]);
  return {
    papers: rows.map((row) =>
      presentPaperRow(
        row,
        idsOf(row).reduce((sum, id) => sum + (marks.get(id) ?? 0), 0),
      ),
    ),
  };
}

export interface AssembledPaper {
  paper: queries.PaperRecord;
  places: queries.PlaceRecord[];
  built: BuiltPaper;
}

/** The paper as it would print now, worked out in the engine's threads. */
export async function assemble(
  context: AppContext,
  connection: Connection,
  paperId: number,
  sealHash: string | null = null,
): Promise<AssembledPaper> {
  const paper = await requirePaper(connection, paperId);
  const places = await queries.selectPlaces(connection, paperId);
  const items = [];
  for (const place of places) {
    const content = itemContentSchema.parse(place.content);
    items.push({
      code: place.itemCode,
      content,
      draw: place.draw,
      figures: await storedFigures(connection, content),
    });
  }
  const built = await context.engine.buildPaper({
    front: {
      organisation: context.settings.organisation,
      code: paper.code,
      title: paper.title,
      subtitle: paper.subtitle,
      durationMinutes: paper.durationMinutes,
      instructions: paper.instructions,
      sealHash,
    },
    items,
  });
  return { paper, places, built };
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
export async function loadPaper(
  context: AppContext,
  connection: Connection,
  actor: SignedIn,
  paperId: number,
): Promise<Paper> {
  demand(actor, 'paper.read');
  const assembled = await assemble(context, connection, paperId);
  const sealed = assembled.paper.state === 'sealed' || assembled.paper.state === 'released';
  return presentPaper({
    ...assembled,
    findings: sealed ? [] : await findingsOf(connection, assembled),
    seal: await queries.selectSeal(connection, paperId),
    actor,
  });
}

/** The paper, and the fact that this person looked at it. */
export async function viewPaper(context: AppContext, actor: SignedIn, paperId: number): Promise<Paper> {
  const paper = await loadPaper(context, context.database, actor, paperId);
  await inTransaction(context.database, (tx) => recordView(tx, actor, paper, 'paper.viewed', 'Looked at'));
  return paper;
}

export async function recordView(
  tx: Transaction,
  actor: SignedIn,
  paper: { id: number; code: string },
  event: string,
  did: string,
): Promise<void> {
  await recordEvent(tx, {
    event,
    actor,
    subjectType: 'paper',
    subjectId: paper.id,
    summary: `${did} ${paper.code}.`,
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
    await recordView(tx, actor, { id, code }, 'paper.created', 'Began');
    return id;
  });
  return loadPaper(context, context.database, actor, paperId);
}

/** Locks the paper and insists on its version; throws AppError conflict with the paper as stored. */
export async function lockVersion(
  context: AppContext,
  tx: Transaction,
  actor: SignedIn,
  paperId: number,
  version: number,
): Promise<queries.PaperRecord> {
  const paper = await requirePaper(tx, paperId, true);
  if (paper.version !== version) {
    throw new AppError('conflict', 'Somebody else changed this paper since you opened it. Compare the two.', {
      current: await loadPaper(context, tx, actor, paperId),
    });
  }
  return paper;
}

export async function saveDetails(
  context: AppContext,
  actor: SignedIn,
  paperId: number,
  { version, ...details }: PaperDetails & { version: number },
): Promise<Paper> {
  await inTransaction(context.database, async (tx) => {
    demand(actor, 'paper.edit');
    const paper = await lockVersion(context, tx, actor, paperId, version);
    const { event } = nextPaperState(paper.state, { kind: 'edit' });
    await queries.updatePaper(tx, paperId, context.clock(), details);
    await recordView(tx, actor, paper, event, 'Changed the details of');
  });
  return loadPaper(context, context.database, actor, paperId);
}

interface WantedPlace {
  itemId: number;
  draw: number | null;
  takeNewest: boolean;
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
  const twice = wanted.places.find(
    (place, index) => wanted.places.findIndex((other) => other.itemId === place.itemId) !== index,
  );
  if (twice !== undefined) throw new AppError('invalid', 'An item can stand on a paper only once.');
  const current = await queries.selectPlaces(context.database, paperId);
  const approved = await queries.selectApproved(
    context.database,
    wanted.places.map((place) => place.itemId),
  );
  const places: { itemId: number; revisionId: number; draw: number }[] = [];
  for (const [index, place] of wanted.places.entries()) {
    const standing = current.find((candidate) => candidate.itemId === place.itemId);
    const newest = approved.get(place.itemId);
    const taken = standing === undefined || place.takeNewest ? newest : standing;
    if (taken === undefined) {
      throw new AppError('invalid', `The item in place ${index + 1} has no approved revision.`, {
        fields: [{ path: `places.${index}.itemId`, message: 'Only approved items can stand on a paper.' }],
      });
    }
    const chosen =
      place.draw ??
      (await context.engine.chooseDraw(itemContentSchema.parse(taken.content), context.random())).draw ??
      1;
    places.push({ itemId: place.itemId, revisionId: taken.revisionId, draw: Math.max(1, chosen) });
  }
  await inTransaction(context.database, async (tx) => {
    const paper = await lockVersion(context, tx, actor, paperId, wanted.version);
    const { event } = nextPaperState(paper.state, { kind: 'edit' });
    await queries.replacePlaces(tx, paperId, places);
    await queries.updatePaper(tx, paperId, context.clock(), {});
    await recordEvent(tx, {
      event,
      actor,
      subjectType: 'paper',
      subjectId: paperId,
      summary: `Changed the running order of ${paper.code}.`,
      before: { places: current.map(({ itemId, revisionId, draw }) => ({ itemId, revisionId, draw })) },
      after: { places },
    });
  });
  return loadPaper(context, context.database, actor, paperId);
}
