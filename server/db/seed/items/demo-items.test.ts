import { readFileSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { assayItem, itemContentSchema, SEVERITIES, type Finding } from '#shared/engine/index.ts';
import { demoTopics } from '../demo-people.ts';
import type { DemoItem } from './demo-item.ts';
import { demoItems } from './index.ts';

function findingsOf(demo: DemoItem): Finding[] {
  const figures = (demo.figures ?? []).map((figure, index) => ({
    ...figure,
    figureId: index + 1,
    svg: readFileSync(new URL(`../../../../public/figures/${figure.file}`, import.meta.url), 'utf8'),
  }));
  const content = itemContentSchema.parse({
    ...demo.content,
    figures: figures.map(({ figureId, alternativeText }) => ({ figureId, alternativeText })),
  });
  return assayItem(content, { figures }).report.findings;
}

const blockers = (demo: DemoItem) =>
  findingsOf(demo)
    .filter((finding) => finding.severity === SEVERITIES[0])
    .map((finding) => finding.code);

describe('the demo', () => {
  it('has at least fourteen items, some in every topic', () => {
    expect(demoItems.length).toBeGreaterThanOrEqual(14);
    expect(new Set(demoItems.map((demo) => demo.topic))).toEqual(new Set(demoTopics.map(({ code }) => code)));
  });

  it.each(
    demoItems.filter((demo) => demo.life !== 'faulty').map((demo) => [demo.content.title, demo] as const),
  )('“%s” is sound enough to be sent to review', (_title, demo) => {
    expect(blockers(demo)).toEqual([]);
  });

  it('shows an item whose answer cancels and whose band is too tight', () => {
    const demo = demoItems.find((one) => one.life === 'faulty' && one.topic === 'DP');
    expect(demo && blockers(demo)).toEqual(
      expect.arrayContaining(['answer-does-not-vary', 'route-outside-band']),
    );
  });

  it('shows an item that claims electrons which its photons cannot free', () => {
    const demo = demoItems.find((one) => one.life === 'faulty' && one.topic === 'PE');
    expect(demo && blockers(demo)).toEqual(expect.arrayContaining(['no-emission']));
  });
});
