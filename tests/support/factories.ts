import { eq } from 'drizzle-orm';

import type { Database } from '#server/db/client.ts';
import * as schema from '#server/db/schema/index.ts';
import type { ItemState } from '#shared/domain/item-life.ts';
import type { PaperState } from '#shared/domain/paper-life.ts';
import type { Role } from '#shared/domain/roles.ts';
import { type ItemContent, itemContentSchema } from '#shared/engine/index.ts';

let made = 0;
/** A number that no other thing of this test worker has. */
export const nextNumber = (): number => (made += 1);

export interface TestPerson {
  id: number;
  name: string;
  email: string;
  roles: Role[];
  passwordHash: string | null;
  active: boolean;
}

/** A person; invented name and address unless given. */
export async function makePerson(
  database: Database,
  given: Partial<Omit<TestPerson, 'id'>> = {},
): Promise<TestPerson> {
  const number = nextNumber();
  const person = {
    name: `Person ${number}`,
    email: `person${number}.${Date.now()}@tests.example`,
    roles: [] as Role[],
    passwordHash: null,
    active: true,
    ...given,
  };
  const { roles, ...columns } = person;
  const [row] = await database.insert(schema.people).values(columns).$returningId();
  if (row === undefined) throw new Error('The person was not stored.');
  if (roles.length > 0) {
    await database.insert(schema.personRoles).values(roles.map((role) => ({ personId: row.id, role })));
  }
  return { id: row.id, ...person };
}

const LETTERS = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ';

/** A topic with a code of three capitals. */
export async function makeTopic(database: Database, name?: string) {
  const number = nextNumber();
  const code = [676, 26, 1].map((place) => LETTERS[Math.floor(number / place) % 26]).join('');
  const topic = { code, name: name ?? `Topic ${number}` };
  const [row] = await database.insert(schema.topics).values(topic).$returningId();
  if (row === undefined) throw new Error('The topic was not stored.');
  return { id: row.id, ...topic };
}

/** A small sound item: the work done on an electron, in one part. */
export function sampleContent(given: Partial<ItemContent> = {}): ItemContent {
  return itemContentSchema.parse({
    title: 'Work done on an electron',
    stem: 'An electron is accelerated from rest through {{Va}}.',
    script: 'Va = draw(150 V, 300 V, 10 V)\nW = e * Va',
    quantities: [
      { name: 'Va', symbol: 'V_a', unit: 'V' },
      { name: 'W', symbol: 'W', unit: 'J', figures: 3 },
    ],
    parts: [
      {
        id: 'a',
        kind: 'numeric',
        text: 'Work out the work done on the electron.',
        marks: 2,
        scheme: [
          { text: 'uses $W = eV$', marks: 1 },
          { text: '{{W}}', marks: 1 },
        ],
        answer: { quantity: 'W', unit: 'J', figures: 3, band: { kind: 'percent', percent: 2 } },
      },
    ],
    ...given,
  });
}

interface ItemGiven {
  ownerId: number;
  topicId?: number;
  state?: ItemState;
  content?: ItemContent;
  /** Everyone who wrote in it besides the owner. */
  authorIds?: number[];
  updatedAt?: Date;
}

/** An item with one revision, straight into the tables. */
export async function makeItem(database: Database, given: ItemGiven) {
  const number = nextNumber();
  const topicId = given.topicId ?? (await makeTopic(database)).id;
  const content = given.content ?? sampleContent();
  const state = given.state ?? 'drafting';
  const code = `T-${number}`;
  const [item] = await database
    .insert(schema.items)
    .values({
      code,
      topicId,
      ownerId: given.ownerId,
      state,
      title: content.title,
      marks: content.parts.reduce((sum, part) => sum + part.marks, 0),
      partsCount: content.parts.length,
      searchText: content.stem,
      ...(given.updatedAt === undefined ? {} : { updatedAt: given.updatedAt }),
    })
    .$returningId();
  if (item === undefined) throw new Error('The item was not stored.');
  const [revision] = await database
    .insert(schema.revisions)
    .values({
      itemId: item.id,
      number: 1,
      state,
      content,
      contentHash: '0'.repeat(64),
      authorId: given.ownerId,
      updatedById: given.ownerId,
    })
    .$returningId();
  if (revision === undefined) throw new Error('The revision was not stored.');
  const authors = new Set([given.ownerId, ...(given.authorIds ?? [])]);
  await database
    .insert(schema.revisionAuthors)
    .values([...authors].map((personId) => ({ revisionId: revision.id, personId })));
  await database
    .update(schema.items)
    .set({
      latestRevisionId: revision.id,
      approvedRevisionId: state === 'approved' ? revision.id : null,
      ...(given.updatedAt === undefined ? {} : { updatedAt: given.updatedAt }),
    })
    .where(eq(schema.items.id, item.id));
  return { id: item.id, code, revisionId: revision.id, topicId, content };
}

type ReviewGiven = Partial<typeof schema.reviews.$inferInsert>;

/** A review of an item's revision, waiting in the queue unless told otherwise. */
export async function makeReview(
  database: Database,
  item: { id: number; revisionId: number },
  requestedById: number,
  given: ReviewGiven = {},
) {
  const [row] = await database
    .insert(schema.reviews)
    .values({ itemId: item.id, revisionId: item.revisionId, requestedById, draw: 1, ...given })
    .$returningId();
  if (row === undefined) throw new Error('The review was not stored.');
  return { id: row.id };
}

interface PaperGiven {
  createdById: number;
  state?: PaperState;
  proposedById?: number | null;
  proposedAt?: Date | null;
  places?: readonly { id: number; revisionId: number }[];
}

/** A paper with its places, straight into the tables. */
export async function makePaper(database: Database, given: PaperGiven) {
  const { places = [], ...columns } = given;
  const code = `P-${nextNumber()}`;
  const [row] = await database
    .insert(schema.papers)
    .values({ code, title: 'Paper', targetMarks: 60, durationMinutes: 75, instructions: '', ...columns })
    .$returningId();
  if (row === undefined) throw new Error('The paper was not stored.');
  if (places.length > 0) {
    await database.insert(schema.paperPlaces).values(
      places.map((item, index) => ({
        paperId: row.id,
        position: index + 1,
        itemId: item.id,
        revisionId: item.revisionId,
        draw: 1,
      })),
    );
  }
  return { id: row.id, code };
}
