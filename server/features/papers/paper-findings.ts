import type { PaperFinding } from '#shared/contracts/papers.ts';
import type { BuiltPaper } from '../../workers/task-types.ts';
import type { PaperRecord, PlaceRecord } from './queries.ts';

export interface PaperToCheck {
  paper: PaperRecord;
  places: readonly PlaceRecord[];
  built: BuiltPaper;
  otherUses: readonly { itemId: number; paperCode: string; draw: number }[];
}

type Finding = PaperFinding;
const plural = (n: number, word: string) => `${n} ${n === 1 ? word : `${word}s`}`;

function totals({ paper, places, built }: PaperToCheck): Finding[] {
  if (places.length === 0) {
    return [
      {
        code: 'no-items',
        severity: 'blocker',
        statement: 'There is no item on this paper.',
        cure: 'Pick items from the bank.',
        placeIds: [],
      },
    ];
  }
  const marks = built.sheet.marks;
  if (marks === paper.targetMarks) return [];
  const off = Math.abs(marks - paper.targetMarks);
  return [
    {
      code: 'total-off-target',
      severity: 'blocker',
      statement: `The paper carries ${plural(marks, 'mark')}, ${off} ${marks < paper.targetMarks ? 'short of' : 'over'} the target of ${paper.targetMarks}.`,
      cure:
        marks < paper.targetMarks
          ? 'Add items, or lower the target.'
          : 'Take items off, or raise the target.',
      placeIds: [],
    },
  ];
}

function draws({ places, built }: PaperToCheck): Finding[] {
  return places.flatMap((place, index): Finding[] => {
    const draw = built.draws[index];
    if (draw === undefined || (draw.compiles && draw.kept)) return [];
    return [
      {
        code: 'draw-discarded',
        severity: 'blocker',
        statement: `Item ${place.position} (${place.itemCode}) has no valid values on draw ${place.draw}.`,
        cure: 'Choose another draw.',
        placeIds: [place.id],
      },
    ];
  });
}

function revisionsBehind({ places }: PaperToCheck): Finding[] {
  return places.flatMap((place): Finding[] => {
    if (place.itemState === 'withdrawn') {
      return [
        {
          code: 'item-withdrawn',
          severity: 'blocker',
          statement: `Item ${place.position} (${place.itemCode}) has been withdrawn.`,
          cure: 'Take it off the paper.',
          placeIds: [place.id],
        },
      ];
    }
    if (place.approvedRevision === null || place.approvedRevision <= place.revision) return [];
    return [
      {
        code: 'newer-revision',
        severity: 'caution',
        statement: `Item ${place.position} (${place.itemCode}) stands at revision ${place.revision}; revision ${place.approvedRevision} is approved.`,
        cure: 'Take the newest revision, or keep this one on purpose.',
        placeIds: [place.id],
      },
    ];
  });
}

function figures({ places }: PaperToCheck): Finding[] {
  return places
    .filter((place) => place.content.figures.some((figure) => figure.alternativeText.trim() === ''))
    .map((place) => ({
      code: 'alternative-text-missing',
      severity: 'blocker',
      statement: `A figure of item ${place.position} (${place.itemCode}) has no alternative text.`,
      cure: 'Have the item revised; the figure must be described.',
      placeIds: [place.id],
    }));
}

/** Values of a sheet's printed quantities, as they stand in its texts. */
function printedValues(sheet: BuiltPaper['sheet']['items'][number]['sheet']): Set<string> {
  const found = new Set<string>();
  JSON.stringify(sheet, (key, value: unknown) => {
    if (key === 'text' && typeof value === 'string') found.add(value);
    return value;
  });
  return found;
}

/** An answer of one item that stands word for word among the values of another. */
function giveaways({ places, built }: PaperToCheck): Finding[] {
  const findings: Finding[] = [];
  const texts = built.sheet.items.map(({ sheet }) => printedValues(sheet));
  built.scheme.items.forEach(({ scheme }, from) => {
    for (const part of scheme.parts) {
      const answer = part.answer?.text;
      // Bare whole numbers stand everywhere by chance; only values with a unit give anything away.
      if (answer === undefined || !/[A-Za-zµΩ°]/.test(answer)) continue;
      texts.forEach((values, at) => {
        if (at === from || !values.has(answer)) return;
        const [source, target] = [places[at], places[from]];
        if (source === undefined || target === undefined) return;
        findings.push({
          code: 'answer-given-away',
          severity: 'caution',
          statement: `Item ${source.position} prints ${answer}, which is the answer to item ${target.position} part (${part.letter}).`,
          cure: 'Choose another draw for one of them.',
          placeIds: [source.id, target.id],
        });
      });
    }
  });
  return findings;
}

function reuse({ places, otherUses }: PaperToCheck): Finding[] {
  return places.flatMap((place): Finding[] => {
    const same = otherUses.filter((use) => use.itemId === place.itemId);
    if (same.length === 0) return [];
    const sameDraw = same.find((use) => use.draw === place.draw);
    return [
      {
        code: sameDraw === undefined ? 'item-on-other-paper' : 'same-draw-on-other-paper',
        severity: sameDraw === undefined ? 'note' : 'caution',
        statement: `Item ${place.position} (${place.itemCode}) also stands on ${same.map((use) => use.paperCode).join(', ')}${sameDraw === undefined ? ', with other values' : `, with the same values on ${sameDraw.paperCode}`}.`,
        cure: sameDraw === undefined ? 'Nothing need be done if that is meant.' : 'Choose another draw.',
        placeIds: [place.id],
      },
    ];
  });
}

function practical({ places }: PaperToCheck): Finding[] {
  return places
    .filter((place) => place.content.practical)
    .map((place) => ({
      code: 'practical-item',
      severity: 'note',
      statement: `Item ${place.position} (${place.itemCode}) is practical work; its cautions are printed with it.`,
      cure: 'Local safety rules and a competent person’s risk assessment come first.',
      placeIds: [place.id],
    }));
}

/** The paper's own checks. Blockers keep it from being proposed or sealed. */
export function findInPaper(paper: PaperToCheck): Finding[] {
  const found = [totals, draws, revisionsBehind, figures, giveaways, reuse, practical].flatMap((check) =>
    check(paper),
  );
  const rank = { blocker: 0, caution: 1, note: 2 } as const;
  return found.sort((a, b) => rank[a.severity] - rank[b.severity]);
}
