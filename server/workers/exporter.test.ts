import { unzipSync } from 'fflate';
import { afterAll, describe, expect, it } from 'vitest';

import { sampleContent } from '#tests/support/factories.ts';

import { buildPaper } from './engine-tasks/build-paper.ts';
import { createExporter } from './exporter.ts';

const exporter = createExporter({
  report: (error) => {
    throw error;
  },
});
afterAll(() => exporter.close());

const { sheet, scheme } = buildPaper({
  front: {
    organisation: 'Invented Board',
    code: 'P-1',
    title: 'Paper',
    subtitle: '',
    durationMinutes: 60,
    instructions: 'Answer all.',
    sealHash: null,
  },
  items: [{ code: 'A-1', content: sampleContent(), draw: 1, figures: [] }],
});

function bodyOf(bytes: Uint8Array): string {
  const document = unzipSync(bytes)['word/document.xml'];
  return new TextDecoder().decode(document);
}

describe('the exporter', () => {
  it('writes the question paper in a thread, without the answers', async () => {
    const bytes = await exporter.export({ kind: 'question-paper', sheet, bitmaps: new Map() });
    expect(bodyOf(bytes)).toContain('Work out the work done on the electron.');
    expect(bodyOf(bytes)).not.toContain('2.40');
  }, 60_000);

  it('writes the mark scheme with the answers', async () => {
    const bytes = await exporter.export({ kind: 'mark-scheme', scheme });
    expect(bodyOf(bytes)).toContain('2.40');
  }, 60_000);
});
