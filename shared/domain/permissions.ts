import type { Role } from './roles.ts';

/** The person who acts, as far as permission is concerned. */
export interface Actor {
  id: number;
  roles: readonly Role[];
}

/** Facts about the thing acted on that ownership rules look at; leave out what does not apply. */
export interface Subject {
  ownerId?: number;
  /** Everyone who wrote any of the revision's content. */
  authorIds?: readonly number[];
  /** The person the review is claimed by or addressed to; null while it waits in the queue. */
  reviewerId?: number | null;
  proposedById?: number | null;
  /** True while the actor has claimed a review of this item and its answers are still hidden from them. */
  workingBlind?: boolean;
  /** True once a paper is released: its content is no longer confidential. */
  released?: boolean;
}

interface Condition {
  /** Returns true when the condition lets the actor through. */
  holds: (actor: Actor, subject: Subject) => boolean;
  refusal: string;
}

interface Permission {
  roles: readonly Role[];
  conditions: readonly Condition[];
  /** Finishes the sentence "Only … can …". */
  description: string;
}

const everyone: readonly Role[] = ['writer', 'reviewer', 'setter', 'moderator', 'administrator'];
const paperRoles: readonly Role[] = ['setter', 'moderator', 'administrator'];

const notWorkingBlind: Condition = {
  holds: (_actor, subject) => subject.workingBlind !== true,
  refusal:
    'You are working this item independently. Finish your working in the review before you open the item.',
};
const ownsItem: Condition = {
  holds: (actor, subject) => subject.ownerId === undefined || subject.ownerId === actor.id,
  refusal: 'Only the owner of this item can do that.',
};
const wroteNoneOfIt: Condition = {
  holds: (actor, subject) =>
    !(subject.authorIds?.includes(actor.id) ?? false) && subject.ownerId !== actor.id,
  refusal: 'You wrote some of this item, so another person must review it.',
};
const isItsReviewer: Condition = {
  holds: (actor, subject) => subject.reviewerId === undefined || subject.reviewerId === actor.id,
  refusal: 'Only the person who claimed this review can do that.',
};
const isFreeOrMine: Condition = {
  holds: (actor, subject) => (subject.reviewerId ?? actor.id) === actor.id,
  refusal: 'This review is addressed to another person.',
};
const isSecondPerson: Condition = {
  holds: (actor, subject) => subject.proposedById !== actor.id,
  refusal: 'You proposed this paper, so a second setter or a moderator must confirm it.',
};

/** Every action that needs permission, who may take it, and under which conditions. The one table. */
export const PERMISSIONS = {
  'topic.list': { roles: everyone, conditions: [], description: 'see the topics' },
  'person.choose': { roles: everyone, conditions: [], description: 'see the names of colleagues' },
  'desk.read': { roles: everyone, conditions: [], description: 'see their desk' },
  'person.list': { roles: ['administrator'], conditions: [], description: 'list people' },
  'person.setRoles': { roles: ['administrator'], conditions: [], description: 'give roles' },
  'record.list': { roles: ['administrator'], conditions: [], description: 'read the records' },

  'item.list': { roles: everyone, conditions: [], description: 'search the bank' },
  'item.create': { roles: ['writer'], conditions: [], description: 'write items' },
  'item.read': {
    roles: ['writer', 'setter', 'moderator', 'administrator'],
    conditions: [notWorkingBlind],
    description: 'open items',
  },
  'item.edit': { roles: ['writer'], conditions: [ownsItem], description: 'edit items' },
  'item.send': { roles: ['writer'], conditions: [ownsItem], description: 'send items to review' },
  'item.recall': { roles: ['writer'], conditions: [ownsItem], description: 'take items back from review' },
  'item.assay': {
    roles: ['writer', 'moderator', 'administrator'],
    conditions: [notWorkingBlind],
    description: 'run an assay',
  },
  'item.withdraw': {
    roles: ['writer', 'administrator'],
    conditions: [
      {
        holds: (actor, subject) =>
          actor.roles.includes('administrator') ||
          subject.ownerId === undefined ||
          subject.ownerId === actor.id,
        refusal: 'Only the owner of this item or an administrator can withdraw it.',
      },
    ],
    description: 'withdraw items',
  },

  'review.list': {
    roles: ['reviewer', 'writer', 'administrator'],
    conditions: [],
    description: 'see reviews',
  },
  'review.read': {
    roles: ['reviewer', 'writer', 'administrator'],
    conditions: [
      {
        holds: (actor, subject) =>
          actor.roles.includes('administrator') ||
          subject.reviewerId === undefined ||
          subject.reviewerId === actor.id ||
          (subject.reviewerId === null && actor.roles.includes('reviewer')) ||
          (subject.authorIds?.includes(actor.id) ?? false) ||
          subject.ownerId === actor.id,
        refusal: 'Only the reviewer and the writers of this item can open its review.',
      },
    ],
    description: 'open reviews',
  },
  'review.claim': {
    roles: ['reviewer'],
    conditions: [wroteNoneOfIt, isFreeOrMine],
    description: 'claim reviews',
  },
  'review.work': {
    roles: ['reviewer'],
    conditions: [wroteNoneOfIt, isItsReviewer],
    description: 'work items under review',
  },
  'review.decide': {
    roles: ['reviewer'],
    conditions: [wroteNoneOfIt, isItsReviewer],
    description: 'decide reviews',
  },
  'review.comment': {
    roles: ['reviewer', 'writer'],
    conditions: [
      {
        holds: (actor, subject) =>
          subject.reviewerId === undefined ||
          subject.reviewerId === actor.id ||
          (subject.authorIds?.includes(actor.id) ?? false) ||
          subject.ownerId === actor.id,
        refusal: 'Only the reviewer and the writers of this item can comment on it.',
      },
    ],
    description: 'comment on items under review',
  },

  'paper.list': { roles: paperRoles, conditions: [], description: 'see papers' },
  'paper.read': { roles: paperRoles, conditions: [], description: 'open papers' },
  'paper.create': { roles: ['setter'], conditions: [], description: 'start papers' },
  'paper.edit': { roles: ['setter'], conditions: [], description: 'assemble papers' },
  'paper.propose': { roles: ['setter'], conditions: [], description: 'propose papers for sealing' },
  'paper.return': {
    roles: ['setter', 'moderator'],
    conditions: [],
    description: 'return proposed papers to assembling',
  },
  'paper.seal': {
    roles: ['setter', 'moderator'],
    conditions: [isSecondPerson],
    description: 'confirm and seal papers',
  },
  'paper.release': { roles: ['setter', 'administrator'], conditions: [], description: 'release papers' },
  'paper.export': { roles: paperRoles, conditions: [], description: 'export papers' },
} as const satisfies Record<string, Permission>;

export type Action = keyof typeof PERMISSIONS;
export const ACTIONS = Object.keys(PERMISSIONS) as Action[];

export type Verdict = { allowed: true } | { allowed: false; reason: string };

function listRoles(roles: readonly Role[]): string {
  const names = roles.map((role) => (role === 'administrator' ? 'an administrator' : `a ${role}`));
  return names.length < 2 ? (names[0] ?? 'nobody') : `${names.slice(0, -1).join(', ')} or ${names.at(-1)}`;
}

/**
 * Decides whether `actor` may take `action` on `subject`.
 * Returns the refusal as a sentence that can be shown; never throws.
 */
export function permit(actor: Actor, action: Action, subject: Subject = {}): Verdict {
  const permission: Permission = PERMISSIONS[action];
  if (!permission.roles.some((role) => actor.roles.includes(role))) {
    return {
      allowed: false,
      reason: `Only ${listRoles(permission.roles)} can ${permission.description}.`,
    };
  }
  for (const condition of permission.conditions) {
    if (!condition.holds(actor, subject)) return { allowed: false, reason: condition.refusal };
  }
  return { allowed: true };
}

/** The actions among `actions` that `actor` may take on `subject`, to be sent with the thing. */
export function abilitiesFor(actor: Actor, actions: readonly Action[], subject: Subject = {}): Action[] {
  return actions.filter((action) => permit(actor, action, subject).allowed);
}
