import type { PaperFinding } from '#shared/contracts/papers.ts';
import { SEVERITIES } from '#shared/engine/index.ts';
import { cautionsFor } from '#shared/sheet/cautions.ts';

import type { BuiltPaper } from '../../workers/task-types.ts';
import type { PlaceRecord } from './queries.ts';

export interface PaperToCheck {
  paper: { targetMarks: number };
  places: readonly PlaceRecord[];
  built: BuiltPaper;
  otherUses: readonly { itemId: number; paperCode: string; draw: number }[];
}

type Check = (paper: PaperToCheck) => PaperFinding[];

const plural = (n: number, word: string) => `${n} ${n === 1 ? word : `${word}s`}`;
const nameOf = (place: PlaceRecord) => `Item ${place.position} (${place.itemCode})`;

const totals: Check = ({ paper, places, built }) => {
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
  const { marks } = built.sheet;
  if (marks === paper.targetMarks) return [];
  const short = marks < paper.targetMarks;
  const off = Math.abs(marks - paper.targetMarks);
  return [
    {
      code: 'total-off-target',
      severity: 'blocker',
      statement: `The paper carries ${plural(marks, 'mark')}, ${off} ${short ? 'short of' : 'over'} the target of ${paper.targetMarks}.`,
      cure: short ? 'Add items, or lower the target.' : 'Take items off, or raise the target.',
      placeIds: [],
    },
  ];
};

const draws: Check = ({ places, built }) =>
  places.flatMap((place, index): PaperFinding[] => {
    const draw = built.draws[index];
    const undefinedParts = built.facts[index]?.undefinedParts ?? [];
    const blocker = (code: string, statement: string): PaperFinding[] => [
      { code, severity: 'blocker', statement, cure: 'Choose another draw.', placeIds: [place.id] },
    ];
    if (draw === undefined || !draw.exists) {
      return blocker('draw-missing', `${nameOf(place)} has no draw ${place.draw}.`);
    }
    if (!draw.compiles || !draw.kept) {
      return blocker('draw-discarded', `${nameOf(place)} has no valid values on draw ${place.draw}.`);
    }
    if (undefinedParts.length === 0) return [];
    return blocker(
      'draw-undefined',
      `${nameOf(place)} has no answer to part ${undefinedParts.map((letter) => `(${letter})`).join(', ')} on draw ${place.draw}.`,
    );
  });

const revisionsBehind: Check = ({ places }) =>
  places.flatMap((place): PaperFinding[] => {
    if (place.itemState === 'withdrawn') {
      return [
        {
          code: 'item-withdrawn',
          severity: 'blocker',
          statement: `${nameOf(place)} has been withdrawn.`,
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
        statement: `${nameOf(place)} stands at revision ${place.revision}; revision ${place.approvedRevision} is approved.`,
        cure: 'Take the newest revision, or keep this one on purpose.',
        placeIds: [place.id],
      },
    ];
  });

const schemes: Check = ({ places }) =>
  places.flatMap((place) =>
    place.content.parts.flatMap((part, index): PaperFinding[] => {
      const lines = part.scheme.reduce((sum, line) => sum + line.marks, 0);
      if (lines === part.marks) return [];
      return [
        {
          code: 'marks-do-not-add-up',
          severity: 'blocker',
          statement: `${nameOf(place)} part (${String.fromCharCode(97 + index)}) carries ${plural(part.marks, 'mark')}, but its mark scheme gives ${lines}.`,
          cure: 'Have the item revised.',
          placeIds: [place.id],
        },
      ];
    }),
  );

const figures: Check = ({ places }) =>
  places
    .filter((place) => place.content.figures.some((figure) => figure.alternativeText.trim() === ''))
    .map((place) => ({
      code: 'alternative-text-missing',
      severity: 'blocker',
      statement: `A figure of item ${place.position} (${place.itemCode}) has no alternative text.`,
      cure: 'Have the item revised; the figure must be described.',
      placeIds: [place.id],
    }));

/**
 * Where one item prints a value that would be accepted as the answer to another: pairs of indexes with what is
 * printed. Bare numbers stand everywhere by chance, so only values with a unit count.
 */
export function coincidences(facts: BuiltPaper['facts']): {
  printedBy: number;
  answers: number;
  letter: string;
  text: string;
}[] {
  return facts.flatMap(({ answers }, target) =>
    answers.flatMap((answer) =>
      facts.flatMap(({ printed }, source) => {
        if (source === target || answer.dimension === null) return [];
        const given = printed.find(
          (value) =>
            value.dimension === answer.dimension &&
            value.valueSI >= answer.fromSI &&
            value.valueSI <= answer.toSI,
        );
        return given === undefined
          ? []
          : [{ printedBy: source, answers: target, letter: answer.letter, text: given.text }];
      }),
    ),
  );
}

const giveaways: Check = ({ places, built }) =>
  coincidences(built.facts).flatMap(({ printedBy, answers, letter, text }): PaperFinding[] => {
    const [source, target] = [places[printedBy], places[answers]];
    if (source === undefined || target === undefined) return [];
    return [
      {
        code: 'answer-given-away',
        severity: 'caution',
        statement: `${nameOf(source)} prints ${text}, which would be accepted for item ${target.position} (${target.itemCode}) part (${letter}).`,
        cure: 'Choose another draw for one of them.',
        placeIds: [source.id, target.id],
      },
    ];
  });

const reuse: Check = ({ places, otherUses }) =>
  places.flatMap((place): PaperFinding[] => {
    const others = otherUses.filter((use) => use.itemId === place.itemId);
    if (others.length === 0) return [];
    const sameDraw = others.find((use) => use.draw === place.draw);
    const papers = others.map((use) => use.paperCode).join(', ');
    return [
      {
        code: sameDraw === undefined ? 'item-on-other-paper' : 'same-draw-on-other-paper',
        severity: sameDraw === undefined ? 'note' : 'caution',
        statement: `${nameOf(place)} also stands on ${papers}, ${sameDraw === undefined ? 'with other values' : `with the same values on ${sameDraw.paperCode}`}.`,
        cure: sameDraw === undefined ? 'Nothing need be done if that is meant.' : 'Choose another draw.',
        placeIds: [place.id],
      },
    ];
  });

const practical: Check = ({ places }) =>
  places
    .filter((place) => place.content.practical)
    .map((place) => ({
      code: 'practical-item',
      severity: 'caution',
      statement: `${nameOf(place)} is practical work. ${cautionsFor(place.content, null, null)[0] ?? 'It names no hazard that is known here.'}`,
      cure: 'Read the printed cautions; local safety rules and a competent person’s risk assessment come first.',
      placeIds: [place.id],
    }));

const CHECKS: readonly Check[] = [
  totals,
  draws,
  revisionsBehind,
  schemes,
  figures,
  giveaways,
  reuse,
  practical,
];

/** The paper's own checks, the gravest first. Blockers keep it from being proposed or sealed. */
export function findInPaper(paper: PaperToCheck): PaperFinding[] {
  const rank = ({ severity }: PaperFinding) => SEVERITIES.indexOf(severity);
  return CHECKS.flatMap((check) => check(paper)).sort((a, b) => rank(a) - rank(b));
}
