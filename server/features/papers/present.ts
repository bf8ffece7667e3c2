import type { Paper, PaperFinding, PaperRow } from '#shared/contracts/papers.ts';
import { abilitiesFor, type Action, type Actor } from '#shared/domain/permissions.ts';

import type { BuiltPaper } from '../../workers/task-types.ts';
import type { PaperRecord, PlaceRecord, SealRecord, selectPapers } from './queries.ts';
import { isIntact } from './seal.ts';

const PAPER_ACTIONS: readonly Action[] = [
  'paper.read',
  'paper.edit',
  'paper.propose',
  'paper.return',
  'paper.seal',
  'paper.release',
  'paper.export',
];

export function presentPaperRow(row: Awaited<ReturnType<typeof selectPapers>>[number]): PaperRow {
  return {
    id: row.id,
    code: row.code,
    title: row.title,
    state: row.state,
    items: row.items,
    marks: row.marks,
    targetMarks: row.targetMarks,
    createdBy: { id: row.createdById, name: row.createdByName },
    updatedAt: row.updatedAt.toISOString(),
  };
}

interface WholePaper {
  paper: PaperRecord;
  places: readonly PlaceRecord[];
  built: BuiltPaper;
  findings: PaperFinding[];
  seal: SealRecord | null;
  actor: Actor;
}

const marksOf = (place: PlaceRecord) => place.content.parts.reduce((sum, part) => sum + part.marks, 0);

/** A paper with its running order, totals, findings and seal, and what this person may do. */
export function presentPaper({ paper, places, built, findings, seal, actor }: WholePaper): Paper {
  const topics = new Map<number, Paper['marksByTopic'][number]>();
  for (const place of places) {
    const topic = { id: place.topicId, code: place.topicCode, name: place.topicName };
    const entry = topics.get(topic.id) ?? { topic, marks: 0 };
    entry.marks += marksOf(place);
    topics.set(topic.id, entry);
  }
  return {
    id: paper.id,
    code: paper.code,
    title: paper.title,
    subtitle: paper.subtitle,
    targetMarks: paper.targetMarks,
    durationMinutes: paper.durationMinutes,
    instructions: paper.instructions,
    state: paper.state,
    version: paper.version,
    createdBy: { id: paper.createdById, name: paper.createdByName },
    proposedBy:
      paper.proposedById === null ? null : { id: paper.proposedById, name: paper.proposedByName ?? '' },
    places: places.map((place, index) => ({
      id: place.id,
      position: place.position,
      itemId: place.itemId,
      itemCode: place.itemCode,
      title: place.content.title,
      topic: { id: place.topicId, code: place.topicCode, name: place.topicName },
      revision: place.revision,
      newerRevision:
        place.approvedRevision !== null && place.approvedRevision > place.revision
          ? place.approvedRevision
          : null,
      marks: marksOf(place),
      draw: place.draw,
      gridSize: built.draws[index]?.gridSize ?? 1,
    })),
    marks: places.reduce((sum, place) => sum + marksOf(place), 0),
    marksByTopic: [...topics.values()].sort((a, b) => a.topic.code.localeCompare(b.topic.code)),
    findings,
    seal:
      seal === null
        ? null
        : {
            sha256: seal.sha256,
            intact: isIntact(seal),
            proposedBy: { id: seal.proposedById, name: seal.proposedByName },
            confirmedBy: { id: seal.confirmedById, name: seal.confirmedByName },
            sealedAt: seal.sealedAt.toISOString(),
          },
    abilities: abilitiesFor(actor, PAPER_ACTIONS, { proposedById: paper.proposedById }),
  };
}
