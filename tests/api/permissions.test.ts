import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { signInAttempts } from '#server/db/schema/index.ts';
import * as contracts from '#shared/contracts/index.ts';
import type { Endpoint } from '#shared/contracts/endpoint.ts';
import { type Action, permit } from '#shared/domain/permissions.ts';
import { ROLES, type Role } from '#shared/domain/roles.ts';
import type { Client } from '#tests/support/client.ts';
import { emptyTables } from '#tests/support/empty-tables.ts';
import { openTestApp } from '#tests/support/test-app.ts';

/** Which action of the permission table each endpoint asks for, written out by hand. */
const ASKED: Record<string, Action | 'signedIn' | 'anyone'> = {
  'health.getHealth': 'anyone',
  'session.getSession': 'anyone',
  'session.signIn': 'anyone',
  'session.signOut': 'signedIn',
  'desk.getDesk': 'desk.read',
  'topics.listTopics': 'topic.list',
  'people.choosePeople': 'person.choose',
  'people.listPeople': 'person.list',
  'people.setRoles': 'person.setRoles',
  'records.listRecords': 'record.list',

  'items.listItems': 'item.list',
  'items.createItem': 'item.create',
  'items.getItem': 'item.read',
  'items.saveDraft': 'item.edit',
  'items.startRevision': 'item.edit',
  'items.listRevisions': 'item.read',
  'items.getRevision': 'item.read',
  'items.assayItem': 'item.assay',
  'items.sendToReview': 'item.send',
  'items.recallItem': 'item.recall',
  'items.withdrawItem': 'item.withdraw',
  'checking.viewDraw': 'item.read',
  'checking.checkItem': 'item.read',
  'figures.listFigures': 'item.read',
  'figures.uploadFigure': 'item.edit',
  'figures.getFigureContent': 'signedIn',

  'reviews.listReviews': 'review.list',
  'reviews.getReview': 'review.read',
  'reviews.claimReview': 'review.claim',
  'reviews.releaseReview': 'review.work',
  'reviews.addWorking': 'review.work',
  'reviews.disputePart': 'review.work',
  'reviews.settlePart': 'review.work',
  'reviews.revealReview': 'review.work',
  'reviews.addComment': 'review.comment',
  'reviews.decideReview': 'review.decide',

  'papers.listPapers': 'paper.list',
  'papers.createPaper': 'paper.create',
  'papers.getPaper': 'paper.read',
  'papers.savePaperDetails': 'paper.edit',
  'papers.savePaperPlaces': 'paper.edit',
  'papers.getPaperSheet': 'paper.read',
  'papers.proposePaper': 'paper.propose',
  'papers.returnPaper': 'paper.return',
  'papers.sealPaper': 'paper.seal',
  'papers.releasePaper': 'paper.release',
  'papers.exportPaper': 'paper.export',
};

function isEndpoint(value: unknown): value is Endpoint {
  return typeof value === 'object' && value !== null && 'method' in value && 'path' in value;
}

const ENDPOINTS = Object.entries(contracts).flatMap(([resource, exports]) =>
  Object.entries(exports)
    .filter((entry): entry is [string, Endpoint] => isEndpoint(entry[1]))
    .map(([name, endpoint]) => ({ name: `${resource}.${name}`, endpoint })),
);

const app = openTestApp();
const clients = new Map<Role, Client>();
let roleless: Client;
beforeAll(async () => {
  await emptyTables(app.context.database);
  for (const role of ROLES) clients.set(role, (await app.signIn([role])).client);
  roleless = (await app.signIn([])).client;
}, 60_000);
beforeEach(async () => {
  await app.context.database.delete(signInAttempts);
});
afterAll(() => app.close());

/** Nothing has this number, so no call changes anything. */
const NOTHING = 999_999;
const PARAMS = {
  personId: NOTHING,
  itemId: NOTHING,
  figureId: NOTHING,
  reviewId: NOTHING,
  paperId: NOTHING,
  number: 1,
  kind: 'question-paper',
};

const attempt = (client: Client, endpoint: Endpoint) =>
  client.attempt(endpoint, { params: PARAMS, ...(endpoint.method === 'GET' ? {} : { body: {} }) });

describe('every endpoint', () => {
  it('stands in the table of this test, and nothing else does', () => {
    expect(ENDPOINTS.map(({ name }) => name).sort()).toEqual(Object.keys(ASKED).sort());
  });

  it.each(ENDPOINTS)('$name is served by one route with the right guard', ({ name, endpoint }) => {
    const served = app.routes.filter(
      ({ contract }) => contract.method === endpoint.method && contract.path === endpoint.path,
    );
    expect(served).toHaveLength(1);
    expect(served[0]?.guard.can).toBe(ASKED[name]);
  });

  it('is the only thing that is served', () => {
    expect(app.routes).toHaveLength(ENDPOINTS.length);
  });
});

describe('without signing in', () => {
  it.each(ENDPOINTS)('$name', async ({ name, endpoint }) => {
    const reply = await attempt(app.visitor(), endpoint);
    if (ASKED[name] === 'anyone') expect([200, 422]).toContain(reply.status);
    else expect(reply).toMatchObject({ status: 401, body: { code: 'notSignedIn' } });
  });
});

/** Signing out is tried apart, since it would end the session that the others use. */
const WALKED = ENDPOINTS.filter(({ name }) => name !== 'session.signOut');

describe.each(ROLES)('as a %s', (role) => {
  it.each(WALKED)('$name', async ({ name, endpoint }) => {
    const client = clients.get(role);
    if (client === undefined) throw new Error(`Nobody is signed in as a ${role}.`);
    const asked = ASKED[name] ?? 'anyone';
    const reply = await attempt(client, endpoint);
    const verdict =
      asked === 'anyone' || asked === 'signedIn'
        ? { allowed: true as const }
        : permit({ id: 1, roles: [role] }, asked);
    if (verdict.allowed) {
      expect([401, 403, 500]).not.toContain(reply.status);
      return;
    }
    expect(reply).toMatchObject({ status: 403, body: { code: 'notAllowed', detail: verdict.reason } });
  });
});

describe('signed in without any role', () => {
  it.each(WALKED)('$name', async ({ name, endpoint }) => {
    const reply = await attempt(roleless, endpoint);
    if (ASKED[name] === 'anyone' || ASKED[name] === 'signedIn') expect(reply.status).not.toBe(403);
    else expect(reply).toMatchObject({ status: 403, body: { code: 'notAllowed' } });
  });
});

describe('without the page’s token', () => {
  it.each(WALKED.filter(({ endpoint }) => endpoint.method !== 'GET'))('$name', async ({ endpoint }) => {
    const client = clients.get('administrator');
    const method = endpoint.method.toLowerCase() as 'post' | 'put' | 'delete';
    const path = endpoint.path.replace(/:\w+/g, '1');
    const reply = await client?.agent[method](path).send({});
    expect(reply?.status).toBe(403);
    expect((reply?.body as { code: string }).code).toBe('badCsrfToken');
  });
});
