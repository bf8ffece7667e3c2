import * as items from '#shared/contracts/items.ts';
import * as papers from '#shared/contracts/papers.ts';
import * as reviews from '#shared/contracts/reviews.ts';
import { type ItemContent, itemContentSchema } from '#shared/engine/index.ts';
import { AppError } from '#shared/errors/app-error.ts';

import type { Client } from './client.ts';
import type { TestApp } from './test-app.ts';

/**
 * An item with two numeric parts and a written one, sound enough to be sent: electrons from a gun. Its script,
 * slip and mark scheme hold words that stand nowhere on the sheet.
 */
export function gunContent(given: Partial<ItemContent> = {}): ItemContent {
  return itemContentSchema.parse({
    title: 'Speed of electrons from a gun',
    stem: 'Electrons leave the cathode of a gun from rest. The accelerating p.d. is {{Va}} and the tube is evacuated.',
    script:
      'Va = draw(410 V, 890 V, 20 V)\nworkdone = e * Va\nswift = sqrt(2 * workdone / m_e)\nrequire(swift > 1.3e7 m/s)',
    quantities: [
      { name: 'Va', symbol: 'V_a', unit: 'V', role: 'acceleratingPd' },
      { name: 'workdone', symbol: 'W', unit: 'J', figures: 3 },
      { name: 'swift', symbol: 'v', unit: 'm s^-1', figures: 3, role: 'speed' },
    ],
    assumptions: ['nonRelativistic', 'fromRest'],
    parts: [
      {
        id: 'work',
        kind: 'numeric',
        text: 'Work out the work done on one electron.',
        marks: 2,
        scheme: [
          { text: 'uses $W = eV_a$ plainly', marks: 1 },
          { text: 'gives {{workdone}}', marks: 1 },
        ],
        answer: { quantity: 'workdone', unit: 'J', figures: 3, band: { kind: 'percent', percent: 2 } },
      },
      {
        id: 'speed',
        kind: 'numeric',
        text: 'Work out the speed at the anode.',
        marks: 3,
        scheme: [
          { text: 'uses $W = \\frac{1}{2}mv^2$', marks: 2 },
          { text: 'gives {{swift}}', marks: 1 },
        ],
        answer: {
          quantity: 'swift',
          unit: 'm s^-1',
          figures: 3,
          band: { kind: 'percent', percent: 4 },
          slips: [
            {
              id: 'half',
              name: 'halving overlooked',
              expression: 'sqrt(workdone / m_e)',
              guidance: 'substitution credited',
              marks: 1,
            },
          ],
        },
      },
      {
        id: 'why',
        kind: 'written',
        text: 'Explain why the tube is evacuated.',
        marks: 1,
        scheme: [{ text: 'collisions would slow them', marks: 1 }],
      },
    ],
    ...given,
  });
}

// Exact by the SI (2019); CODATA 2022 for the mass.
const ELEMENTARY_CHARGE = 1.602176634e-19;
const ELECTRON_MASS = 9.1093837139e-31;

/** The right values of `gunContent` for a p.d. in volts, SI, worked out here and not by the engine. */
export function gunValues(volts: number): { work: number; speed: number } {
  const work = ELEMENTARY_CHARGE * volts;
  return { work, speed: Math.sqrt((2 * work) / ELECTRON_MASS) };
}

/** The same as a candidate writes them. */
export function gunAnswers(volts: number): { work: string; speed: string } {
  const { work, speed } = gunValues(volts);
  return { work: `${work.toExponential(3)} J`, speed: `${speed.toExponential(3)} m/s` };
}

/** `gunContent` with one caution: its last part asks nothing. */
export function cautionedContent(): ItemContent {
  const content = gunContent();
  return {
    ...content,
    parts: content.parts.map((part) => (part.kind === 'written' ? { ...part, text: '' } : part)),
  };
}

/** The p.d. that a sheet of `gunContent` prints, in volts. */
export function printedVolts(sheet: unknown): number {
  const volts = /"text":"(\d+)\u202FV"/.exec(JSON.stringify(sheet))?.[1];
  if (volts === undefined) throw new Error('The sheet prints no p.d.');
  return Number(volts);
}

/** Times that a busy machine may refuse before it is taken to be broken; each waits half a minute. */
const STARTS = 4;

/** Waits until the engine's threads run: from their sources that takes seconds, many on a busy machine. */
export async function startEngine({ context: { engine } }: TestApp): Promise<void> {
  const content = gunContent();
  for (let start = 1; ; start += 1) {
    try {
      await Promise.all([engine.cautions(content), engine.assay(content)]);
      return;
    } catch (error) {
      if (!(error instanceof AppError) || error.code !== 'busy' || start === STARTS) throw error;
    }
  }
}

/** A writer's new item with this content, saved once. */
export async function writeItem(writer: Client, topicId: number, content: ItemContent = gunContent()) {
  const made = await writer.call(items.createItem, { body: { title: content.title, topicId } });
  await writer.call(items.saveDraft, { params: { itemId: made.id }, body: { version: 1, content } });
  return made;
}

/** Sends the item as it stands to the queue, or to `reviewerId`. Gives the id of its review. */
export async function sendItem(writer: Client, itemId: number, reviewerId: number | null = null) {
  const { revision } = await writer.call(items.getItem, { params: { itemId } });
  const sent = await writer.call(items.sendToReview, {
    params: { itemId },
    body: { version: revision.version, note: 'ready', reviewerId },
  });
  if (sent.reviewId === null) throw new Error('Sending made no review.');
  return sent.reviewId;
}

/** Claims a review of `gunContent`, works both numeric parts rightly and has the answers shown. */
export async function workReview(reviewer: Client, reviewId: number) {
  const params = { reviewId };
  const { sheet } = await reviewer.call(reviews.claimReview, { params });
  const { work, speed } = gunAnswers(printedVolts(sheet));
  await reviewer.call(reviews.addWorking, { params, body: { partId: 'work', text: work } });
  await reviewer.call(reviews.addWorking, { params, body: { partId: 'speed', text: speed } });
  return reviewer.call(reviews.revealReview, { params });
}

export const approve = (reviewer: Client, reviewId: number, acceptedCautions: Record<string, string> = {}) =>
  reviewer.call(reviews.decideReview, {
    params: { reviewId },
    body: { decision: 'approved', acceptedCautions },
  });

/** An item that two people have brought to approval. */
export async function approvedItem(writer: Client, reviewer: Client, topicId: number, content?: ItemContent) {
  const made = await writeItem(writer, topicId, content);
  const reviewId = await sendItem(writer, made.id);
  await workReview(reviewer, reviewId);
  await approve(reviewer, reviewId);
  return made;
}

/** A setter's new paper with these items on draws that the server chooses; its target is its total. */
export async function assemblePaper(setter: Client, itemIds: readonly number[], marksEach = 6) {
  const made = await setter.call(papers.createPaper, {
    body: { title: 'Beams and fields', targetMarks: Math.max(1, marksEach * itemIds.length) },
  });
  return setter.call(papers.savePaperPlaces, {
    params: { paperId: made.id },
    body: { version: made.version, places: itemIds.map((itemId) => ({ itemId, draw: null })) },
  });
}
