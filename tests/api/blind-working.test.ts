import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import * as contracts from '#shared/contracts/index.ts';
import type { Endpoint } from '#shared/contracts/endpoint.ts';
import { ROLES } from '#shared/domain/roles.ts';
import type { Client } from '#tests/support/client.ts';
import { emptyTables } from '#tests/support/empty-tables.ts';
import { makeTopic } from '#tests/support/factories.ts';
import {
  cautionedContent,
  gunAnswers,
  gunValues,
  printedVolts,
  sendItem,
  startEngine,
  writeItem,
} from '#tests/support/steps.ts';
import { openTestApp } from '#tests/support/test-app.ts';

const app = openTestApp();
const { database } = app.context;
beforeAll(() => startEngine(app), 150_000);
beforeEach(() => emptyTables(database));
afterAll(() => app.close());

/** Words of script, slips, mark scheme and report that no candidate sees; all are in the reveal. */
const SECRETS = [
  'workdone',
  'swift',
  'sqrt',
  'draw(410',
  'halving overlooked',
  'substitution credited',
  'plainly',
  'collisions would slow',
  'text-empty',
  'routeSpread',
  'contentHash',
];

/** The first figures of a value as a text or a number could hold them: 1.4420e-17 as 1.44, 1.4420 and 14420. */
function figuresOf(value: number): string[] {
  const [mantissa = ''] = value.toExponential(9).split('e');
  const cut = mantissa.slice(0, 6);
  return [Number(mantissa).toFixed(2), cut, cut.replace('.', '')];
}

/** A reply without what is chance: times, ids, tokens and the addresses of the tests' people. */
function withoutChance(reply: string): string {
  return reply
    .replace(/"(?:\w*At|\w*On|at|since|csrfToken|email|requestId)":"[^"]*"/g, '')
    .replace(/"(?:id|\w+Id)":\d+/g, '');
}

const isEndpoint = (value: unknown): value is Endpoint =>
  typeof value === 'object' && value !== null && 'method' in value && 'path' in value;

/** Everything that can be asked for without changing anything, and the two checks of unsaved content. */
const ASKED = Object.values(contracts)
  .flatMap((resource) => Object.values(resource).filter(isEndpoint))
  .filter(({ method, path }) => method === 'GET' || /\/(draw|check|assay)$/.test(path));

/** What one person can get from every endpoint about this item and review, as text; what is refused included. */
async function askEverything(
  client: Client,
  known: { itemId: number; reviewId: number; searches: readonly string[] },
): Promise<string> {
  const params = {
    ...known,
    searches: '',
    number: 1,
    paperId: 1,
    figureId: 1,
    personId: 1,
    kind: 'mark-scheme',
  };
  const replies: unknown[] = [];
  for (const endpoint of ASKED) {
    // Their own content is all that the check of unsaved content can know.
    const body = endpoint.method === 'GET' ? {} : { body: { content: { title: 'Mine' } } };
    const reply = await client.attempt(endpoint, { params, ...body });
    expect(reply.status).not.toBe(500);
    replies.push([endpoint.path, reply.status, reply.body]);
  }
  for (const query of [
    ...known.searches.map((search) => ({ search })),
    ...['blocker', 'caution', 'note'].map((finding) => ({ finding })),
  ]) {
    const { total } = await client.call(contracts.items.listItems, { query });
    expect([query, total]).toEqual([query, 0]);
  }
  return withoutChance(JSON.stringify(replies));
}

const holders: [string, readonly (typeof ROLES)[number][]][] = [
  ['reviewer alone', ['reviewer']],
  ['reviewer with every other role', ROLES],
];

describe.each(holders)('before the reveal, to a %s', (_name, roles) => {
  async function claimed() {
    const { client: writer } = await app.signIn(['writer']);
    const { client: reviewer } = await app.signIn(roles);
    const made = await writeItem(writer, (await makeTopic(database)).id, cautionedContent());
    const reviewId = await sendItem(writer, made.id);
    const params = { reviewId };
    const review = await reviewer.call(contracts.reviews.claimReview, { params });
    return { reviewer, made, reviewId, params, review, volts: printedVolts(review.sheet) };
  }

  /** Fails naming the secret that a text tells; the text itself would fill pages. */
  function expectSilent(text: string, secrets: readonly string[]): void {
    expect(secrets.filter((secret) => text.includes(secret))).toEqual([]);
  }

  it('no reply tells an answer, the script, a slip, the mark scheme or a finding', async () => {
    const { reviewer, made, reviewId, params, review, volts } = await claimed();
    const { work, speed } = gunValues(volts);
    const secrets = [...SECRETS, ...figuresOf(work), ...figuresOf(speed)];
    const known = { itemId: made.id, reviewId, searches: ['workdone', 'collisions', 'halving', 'sqrt'] };
    expectSilent(withoutChance(JSON.stringify(review)), secrets);
    expectSilent(await askEverything(reviewer, known), secrets);

    // Tries that are wrong in one way alone: unit, sign, power of ten, a slip of the writer's.
    const typed: string[] = [];
    const silent = (text: string) =>
      expectSilent(
        typed.reduce((left, own) => left.replaceAll(own, ''), text),
        secrets,
      );
    const answerWith = async (partId: string, text: string) => {
      typed.push(text);
      const reply = await reviewer.attempt(contracts.reviews.addWorking, { params, body: { partId, text } });
      silent(withoutChance(JSON.stringify(reply.body)));
      return reply.status;
    };
    expect(await answerWith('work', `${work.toExponential(3)} V`)).toBe(422);
    expect(await answerWith('work', `${(-work).toExponential(3)} J`)).toBe(200);
    expect(await answerWith('work', `${(100 * work).toExponential(3)} J`)).toBe(200);
    expect(await answerWith('speed', `${(speed / Math.SQRT2).toExponential(3)} m/s`)).toBe(200);
    const { workings } = await reviewer.call(contracts.reviews.getReview, { params });
    expect(workings.map(({ remark }) => remark)).toEqual(
      Array.from({ length: 3 }, () => 'Your working does not agree with the checker.'),
    );
    silent(await askEverything(reviewer, known));
  });

  it('what is looked for does stand in the reveal, so that the search could find it', async () => {
    const { reviewer, reviewId, volts } = await claimed();
    const { work, speed } = gunAnswers(volts);
    for (const [partId, text] of Object.entries({ work, speed })) {
      const params = { reviewId };
      await reviewer.call(contracts.reviews.addWorking, { params, body: { partId, text } });
    }
    const shown = await reviewer.call(contracts.reviews.revealReview, { params: { reviewId } });
    const text = JSON.stringify(shown.reveal);
    expect(SECRETS.filter((secret) => !text.includes(secret))).toEqual([]);
    for (const value of Object.values(gunValues(volts)))
      expect(figuresOf(value).some((figures) => text.includes(figures))).toBe(true);
  });
});
