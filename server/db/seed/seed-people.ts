import { hashPassword } from '../../features/session/password.ts';
import type { SignedIn } from '../../http/signed-in.ts';
import type { Database } from '../client.ts';
import { people, personRoles, topics } from '../schema/index.ts';
import { DEMO_PASSWORD, demoPeople, demoTopics } from './demo-people.ts';

export type DemoRole = keyof typeof demoPeople;

/** Stores the five demo people; each is then ready to act. */
export async function seedPeople(database: Database): Promise<Record<DemoRole, SignedIn>> {
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  const stored: Partial<Record<DemoRole, SignedIn>> = {};
  for (const key of Object.keys(demoPeople) as DemoRole[]) {
    const { name, email, roles } = demoPeople[key];
    const [row] = await database.insert(people).values({ name, email, passwordHash }).$returningId();
    if (row === undefined) throw new Error(`${name} was not stored.`);
    await database.insert(personRoles).values(roles.map((role) => ({ personId: row.id, role })));
    stored[key] = { id: row.id, name, email, roles: [...roles], sessionRef: 'demo' };
  }
  return stored as Record<DemoRole, SignedIn>;
}

/** Stores the demo's topics; gives their ids by code. */
export async function seedTopics(database: Database): Promise<Map<string, number>> {
  const ids = new Map<string, number>();
  for (const [position, topic] of demoTopics.entries()) {
    const [row] = await database
      .insert(topics)
      .values({ ...topic, position })
      .$returningId();
    if (row !== undefined) ids.set(topic.code, row.id);
  }
  return ids;
}
