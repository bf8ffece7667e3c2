/** The five roles; one person can hold several. */
export const ROLES = ['writer', 'reviewer', 'setter', 'moderator', 'administrator'] as const;
export type Role = (typeof ROLES)[number];

/** What each role must get done, one line, as shown where roles are given. */
export const ROLE_DESCRIPTIONS: Readonly<Record<Role, string>> = {
  writer: 'Writes items and answers the reviewer’s points.',
  reviewer: 'Works each item independently, then approves or returns it.',
  setter: 'Assembles papers from approved items and exports them.',
  moderator: 'Audits accepted bands and confirms papers for sealing.',
  administrator: 'Invites people, gives roles and reads the records.',
};
