import type { Role } from '#shared/domain/roles.ts';

/** One password for every demo person; printed at the start, and never used outside the demo. */
export const DEMO_PASSWORD = 'oil drop at rest';

/** Five invented people, one for each role. */
export const demoPeople = {
  writer: { name: 'Ines Varga-Holt', email: 'ines@larkmoor.example', roles: ['writer'] },
  reviewer: { name: 'Tomas Eklundh', email: 'tomas@larkmoor.example', roles: ['reviewer'] },
  setter: { name: 'Farida Oduya', email: 'farida@larkmoor.example', roles: ['setter'] },
  moderator: { name: 'Ewan Trelisk', email: 'ewan@larkmoor.example', roles: ['moderator'] },
  administrator: { name: 'Mirela Castane', email: 'mirela@larkmoor.example', roles: ['administrator'] },
} as const satisfies Record<string, { name: string; email: string; roles: Role[] }>;

export interface DemoTopic {
  code: string;
  name: string;
}

/** The nine topics; the codes begin the codes of their items. */
export const demoTopics: readonly DemoTopic[] = [
  { code: 'EG', name: 'Electron guns' },
  { code: 'CF', name: 'Crossed fields' },
  { code: 'CP', name: 'Circular paths' },
  { code: 'DP', name: 'Deflecting plates' },
  { code: 'OD', name: 'Oil drops' },
  { code: 'QC', name: 'Quantised charge' },
  { code: 'PE', name: 'Photoelectric effect' },
  { code: 'PL', name: 'Photons and levels' },
  { code: 'MW', name: 'Matter waves' },
];
