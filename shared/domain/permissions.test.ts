import { describe, expect, it } from 'vitest';

import { abilitiesFor, type Action, ACTIONS, permit, PERMISSIONS, type Subject } from './permissions.ts';
import { type Role, ROLES } from './roles.ts';

/** Who may take which action, written out by hand: W writer, R reviewer, S setter, M moderator, A administrator. */
const TABLE: Record<Action, string> = {
  'topic.list': 'W R S M A',
  'person.choose': 'W R S M A',
  'desk.read': 'W R S M A',
  'person.list': '- - - - A',
  'person.setRoles': '- - - - A',
  'record.list': '- - - - A',
  'item.list': 'W R S M A',
  'item.create': 'W - - - -',
  'item.read': 'W - S M A',
  'item.edit': 'W - - - -',
  'item.send': 'W - - - -',
  'item.recall': 'W - - - -',
  'item.assay': 'W - - M A',
  'item.withdraw': 'W - - - A',
  'review.list': 'W R - - A',
  'review.read': 'W R - - A',
  'review.claim': '- R - - -',
  'review.work': '- R - - -',
  'review.decide': '- R - - -',
  'review.comment': 'W R - - -',
  'paper.list': '- - S M A',
  'paper.read': '- - S M A',
  'paper.create': '- - S - -',
  'paper.edit': '- - S - -',
  'paper.propose': '- - S - -',
  'paper.return': '- - S M -',
  'paper.seal': '- - S M -',
  'paper.release': '- - S - A',
  'paper.export': '- - S M A',
};
const COLUMNS: readonly Role[] = ['writer', 'reviewer', 'setter', 'moderator', 'administrator'];

const ME = 7;
const OTHER = 8;

describe('who may do what by role alone', () => {
  it('names every action of the permission table', () => {
    expect(Object.keys(TABLE).sort()).toEqual([...ACTIONS].sort());
    expect([...ROLES].sort()).toEqual([...COLUMNS].sort());
  });

  const cells = ACTIONS.flatMap((action) =>
    COLUMNS.map((role, column) => ({
      action,
      role,
      allowed: TABLE[action].split(' ')[column] !== '-',
    })),
  );
  it.each(cells)('$role, $action: $allowed', ({ action, role, allowed }) => {
    expect(permit({ id: ME, roles: [role] }, action).allowed).toBe(allowed);
  });

  it.each(ACTIONS)('lets nobody without a role take %s', (action) => {
    expect(permit({ id: ME, roles: [] }, action).allowed).toBe(false);
  });

  it('gives a person with two roles what either may do', () => {
    const actor = { id: ME, roles: ['reviewer', 'setter'] as const };
    expect(permit(actor, 'paper.create').allowed).toBe(true);
    expect(permit(actor, 'review.claim').allowed).toBe(true);
    expect(permit(actor, 'item.create').allowed).toBe(false);
  });

  it('says who can when somebody cannot', () => {
    expect(permit({ id: ME, roles: ['writer'] }, 'paper.release')).toEqual({
      allowed: false,
      reason: 'Only a setter or an administrator can release papers.',
    });
    expect(permit({ id: ME, roles: [] }, 'item.assay')).toEqual({
      allowed: false,
      reason: 'Only a writer, a moderator or an administrator can run an assay.',
    });
  });

  it('ends every refusal as a sentence', () => {
    for (const action of ACTIONS) {
      const verdict = permit({ id: ME, roles: [] }, action);
      expect(verdict.allowed ? '' : verdict.reason).toMatch(/^Only an? .+ can .+\.$/);
      for (const condition of PERMISSIONS[action].conditions)
        expect(condition.refusal).toMatch(/^[A-Z].+\.$/);
    }
  });
});

interface OwnershipCase {
  name: string;
  roles: Role[];
  action: Action;
  subject: Subject;
  allowed: boolean;
}

const OWNERSHIP: OwnershipCase[] = [
  {
    name: 'a writer edits an own item',
    roles: ['writer'],
    action: 'item.edit',
    subject: { ownerId: ME },
    allowed: true,
  },
  {
    name: 'a writer edits another’s item',
    roles: ['writer'],
    action: 'item.edit',
    subject: { ownerId: OTHER },
    allowed: false,
  },
  {
    name: 'an administrator who writes edits another’s item',
    roles: ['writer', 'administrator'],
    action: 'item.edit',
    subject: { ownerId: OTHER },
    allowed: false,
  },
  {
    name: 'a writer sends another’s item',
    roles: ['writer'],
    action: 'item.send',
    subject: { ownerId: OTHER },
    allowed: false,
  },
  {
    name: 'a writer takes another’s item back',
    roles: ['writer'],
    action: 'item.recall',
    subject: { ownerId: OTHER },
    allowed: false,
  },
  {
    name: 'a writer withdraws an own item',
    roles: ['writer'],
    action: 'item.withdraw',
    subject: { ownerId: ME },
    allowed: true,
  },
  {
    name: 'a writer withdraws another’s item',
    roles: ['writer'],
    action: 'item.withdraw',
    subject: { ownerId: OTHER },
    allowed: false,
  },
  {
    name: 'an administrator withdraws another’s item',
    roles: ['administrator'],
    action: 'item.withdraw',
    subject: { ownerId: OTHER },
    allowed: true,
  },
  {
    name: 'a writer opens another’s item',
    roles: ['writer'],
    action: 'item.read',
    subject: { ownerId: OTHER },
    allowed: true,
  },
  {
    name: 'somebody opens an item that they work blind',
    roles: ['writer', 'reviewer'],
    action: 'item.read',
    subject: { ownerId: OTHER, workingBlind: true },
    allowed: false,
  },
  {
    name: 'somebody assays an item that they work blind',
    roles: ['moderator', 'reviewer'],
    action: 'item.assay',
    subject: { workingBlind: true },
    allowed: false,
  },

  {
    name: 'a reviewer claims a free review',
    roles: ['reviewer'],
    action: 'review.claim',
    subject: { ownerId: OTHER, authorIds: [OTHER], reviewerId: null },
    allowed: true,
  },
  {
    name: 'a reviewer claims a review addressed to them',
    roles: ['reviewer'],
    action: 'review.claim',
    subject: { ownerId: OTHER, authorIds: [OTHER], reviewerId: ME },
    allowed: true,
  },
  {
    name: 'a reviewer claims a review addressed to another',
    roles: ['reviewer'],
    action: 'review.claim',
    subject: { ownerId: OTHER, authorIds: [OTHER], reviewerId: OTHER },
    allowed: false,
  },
  {
    name: 'an author claims the review of their item',
    roles: ['reviewer', 'writer'],
    action: 'review.claim',
    subject: { ownerId: OTHER, authorIds: [OTHER, ME], reviewerId: null },
    allowed: false,
  },
  {
    name: 'an owner claims the review of their item',
    roles: ['reviewer', 'writer'],
    action: 'review.claim',
    subject: { ownerId: ME, authorIds: [], reviewerId: null },
    allowed: false,
  },
  {
    name: 'an author decides',
    roles: ['reviewer', 'writer'],
    action: 'review.decide',
    subject: { ownerId: OTHER, authorIds: [ME], reviewerId: ME },
    allowed: false,
  },
  {
    name: 'the reviewer works',
    roles: ['reviewer'],
    action: 'review.work',
    subject: { ownerId: OTHER, authorIds: [OTHER], reviewerId: ME },
    allowed: true,
  },
  {
    name: 'a second reviewer works a claimed review',
    roles: ['reviewer'],
    action: 'review.work',
    subject: { ownerId: OTHER, authorIds: [OTHER], reviewerId: OTHER },
    allowed: false,
  },
  {
    name: 'a reviewer works an unclaimed review',
    roles: ['reviewer'],
    action: 'review.work',
    subject: { ownerId: OTHER, authorIds: [OTHER], reviewerId: null },
    allowed: false,
  },
  {
    name: 'the reviewer decides',
    roles: ['reviewer'],
    action: 'review.decide',
    subject: { ownerId: OTHER, authorIds: [OTHER], reviewerId: ME },
    allowed: true,
  },
  {
    name: 'a second reviewer decides a claimed review',
    roles: ['reviewer'],
    action: 'review.decide',
    subject: { ownerId: OTHER, authorIds: [OTHER], reviewerId: OTHER },
    allowed: false,
  },

  {
    name: 'a reviewer opens a review in the queue',
    roles: ['reviewer'],
    action: 'review.read',
    subject: { ownerId: OTHER, authorIds: [OTHER], reviewerId: null },
    allowed: true,
  },
  {
    name: 'a reviewer opens another’s review',
    roles: ['reviewer'],
    action: 'review.read',
    subject: { ownerId: OTHER, authorIds: [OTHER], reviewerId: OTHER },
    allowed: false,
  },
  {
    name: 'the owner opens the review of their item',
    roles: ['writer'],
    action: 'review.read',
    subject: { ownerId: ME, authorIds: [ME], reviewerId: OTHER },
    allowed: true,
  },
  {
    name: 'a writer opens the review of another’s item',
    roles: ['writer'],
    action: 'review.read',
    subject: { ownerId: OTHER, authorIds: [OTHER], reviewerId: null },
    allowed: false,
  },
  {
    name: 'an administrator opens any review',
    roles: ['administrator'],
    action: 'review.read',
    subject: { ownerId: OTHER, authorIds: [OTHER], reviewerId: OTHER },
    allowed: true,
  },
  {
    name: 'an author comments',
    roles: ['writer'],
    action: 'review.comment',
    subject: { ownerId: OTHER, authorIds: [ME], reviewerId: OTHER },
    allowed: true,
  },
  {
    name: 'a stranger comments',
    roles: ['writer'],
    action: 'review.comment',
    subject: { ownerId: OTHER, authorIds: [OTHER], reviewerId: OTHER },
    allowed: false,
  },

  {
    name: 'a second setter seals',
    roles: ['setter'],
    action: 'paper.seal',
    subject: { proposedById: OTHER },
    allowed: true,
  },
  {
    name: 'the proposer seals',
    roles: ['setter'],
    action: 'paper.seal',
    subject: { proposedById: ME },
    allowed: false,
  },
  {
    name: 'the proposer seals as moderator',
    roles: ['setter', 'moderator'],
    action: 'paper.seal',
    subject: { proposedById: ME },
    allowed: false,
  },
  {
    name: 'a moderator seals',
    roles: ['moderator'],
    action: 'paper.seal',
    subject: { proposedById: OTHER },
    allowed: true,
  },
];

describe('who may do what by ownership', () => {
  it.each(OWNERSHIP)('$name: $allowed', ({ roles, action, subject, allowed }) => {
    expect(permit({ id: ME, roles }, action, subject).allowed).toBe(allowed);
  });

  it('explains a refusal by ownership in its own words', () => {
    const verdict = permit({ id: ME, roles: ['setter'] }, 'paper.seal', { proposedById: ME });
    expect(verdict).toEqual({
      allowed: false,
      reason: 'You proposed this paper, so a second setter or a moderator must confirm it.',
    });
  });
});

describe('abilities', () => {
  it('lists what an actor may do with one thing, in the order asked', () => {
    const actor = { id: ME, roles: ['writer'] as const };
    const asked: Action[] = ['item.withdraw', 'item.edit', 'item.read', 'review.claim'];
    expect(abilitiesFor(actor, asked, { ownerId: ME })).toEqual(['item.withdraw', 'item.edit', 'item.read']);
    expect(abilitiesFor(actor, asked, { ownerId: OTHER })).toEqual(['item.read']);
  });
});
