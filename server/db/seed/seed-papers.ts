import type { AppContext } from '../../context.ts';
import { proposePaper, sealPaper } from '../../features/papers/life-service.ts';
import { createPaper, savePlaces } from '../../features/papers/service.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import type { DemoRole } from './seed-people.ts';

const INSTRUCTIONS = [
  'Answer all questions in the spaces given.',
  'Show your working: marks are given for it.',
  'Give each answer with its unit.',
  'Use the values on the data page.',
].join('\n');

/** Items of the sealed paper, 60 marks, and of the one that is being assembled. */
const SEALED = ['EG-001', 'CF-001', 'CP-001', 'DP-001', 'OD-001', 'QC-001', 'PE-001', 'MW-001'];
const ASSEMBLING = ['CP-002', 'PL-001'];

/** Puts the items on the paper; the server chooses a draw for each. */
async function place(
  context: AppContext,
  setter: SignedIn,
  paperId: number,
  version: number,
  ids: readonly number[],
) {
  return savePlaces(context, setter, paperId, {
    version,
    places: ids.map((itemId) => ({ itemId, draw: null, takeNewest: false })),
  });
}

/** One paper that two people have sealed, and one that is being assembled. */
export async function seedPapers(
  context: AppContext,
  people: Record<DemoRole, SignedIn>,
  itemIds: ReadonlyMap<string, number>,
): Promise<void> {
  const ids = (codes: readonly string[]) => codes.flatMap((code) => itemIds.get(code) ?? []);
  const first = await createPaper(context, people.setter, {
    title: 'Charged particles and quanta',
    subtitle: 'Specimen paper',
    targetMarks: 60,
    durationMinutes: 75,
    instructions: INSTRUCTIONS,
  });
  const placed = await place(context, people.setter, first.id, first.version, ids(SEALED));
  const proposed = await proposePaper(context, people.setter, first.id, placed.version);
  await sealPaper(context, people.moderator, first.id, proposed.version);

  const second = await createPaper(context, people.setter, {
    title: 'Charged particles and quanta',
    subtitle: 'Second sitting',
    targetMarks: 60,
    durationMinutes: 75,
    instructions: INSTRUCTIONS,
  });
  await place(context, people.setter, second.id, second.version, ids(ASSEMBLING));
}
