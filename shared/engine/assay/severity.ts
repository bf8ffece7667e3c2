import type { Check, Severity } from './report.ts';

/** How serious each finding is, and why: the one table that a reader can audit. */
export const SEVERITY_TABLE = {
  // defined
  'script-mistake': ['defined', 'blocker', 'The script does not compile, so nothing can be worked out.'],
  'no-parts': ['defined', 'blocker', 'An item without a part asks nothing.'],
  'undefined-value': ['defined', 'blocker', 'Some draw has no answer.'],
  'no-draw-kept': ['defined', 'blocker', 'Every draw is discarded, so the item can never be set.'],
  'most-draws-discarded': ['defined', 'note', 'The ranges are wider than the item can use.'],
  // limits
  'faster-than-light': ['limits', 'blocker', 'No particle moves faster than light.'],
  'not-positive': ['limits', 'blocker', 'Such a quantity cannot be zero or negative.'],
  'not-whole': ['limits', 'blocker', 'Charges and levels are counted in whole numbers.'],
  'no-emission': ['limits', 'blocker', 'The text claims electrons that the photons cannot free.'],
  'unclaimed-emission': ['limits', 'blocker', 'The text denies electrons that the photons do free.'],
  'beam-hits-plate': ['limits', 'blocker', 'The text says that the beam leaves the plates.'],
  'air-breaks-down': ['limits', 'caution', 'A spark would pass; in a vacuum the field could stand.'],
  'implausible-size': ['limits', 'caution', 'No school or first-degree apparatus reaches such a value.'],
  // laws
  'law-broken': ['laws', 'blocker', 'The numbers contradict a published law that binds them.'],
  // validity
  'model-error-over-band': ['validity', 'blocker', 'A candidate who works exactly is marked wrong.'],
  'model-error-near-band': ['validity', 'caution', 'The model’s own error takes over a third of the band.'],
  'model-error-stated': ['validity', 'note', 'The stem states the simplification.'],
  // dependence
  'answer-does-not-vary': [
    'dependence',
    'blocker',
    'The answer is the same on every draw: its givens cancel.',
  ],
  'answer-on-data-sheet': ['dependence', 'caution', 'The answer could be quoted instead of worked out.'],
  'sought-constant-used': ['dependence', 'caution', 'The working uses the constant that it asks for.'],
  'given-cancels': ['dependence', 'note', 'The working uses a value that does not move its answer.'],
  'given-unused': ['dependence', 'note', 'A printed value that no answer needs.'],
  // routes
  'route-outside-band': ['routes', 'blocker', 'An honest way of rounding loses the mark.'],
  // uniqueness
  'slip-inside-band': ['uniqueness', 'blocker', 'A known mistake earns the mark by luck.'],
  'slip-mistake': ['uniqueness', 'blocker', 'The slip’s expression cannot be worked out.'],
  'near-miss-inside-band': ['uniqueness', 'caution', 'A likely wrong working earns the mark on some draw.'],
  'near-miss-by-chance': [
    'uniqueness',
    'note',
    'A wrong working whose units are wrong too has the right number on some draw.',
  ],
  // band
  'band-mistake': ['band', 'blocker', 'The band cannot be worked out, so nothing can be marked.'],
  'band-too-wide': ['band', 'note', 'The band is much wider than honest rounding needs.'],
  'no-band-fits': ['band', 'caution', 'No tidy band takes all routes and keeps all wrong workings out.'],
  // variety
  'few-answers': ['variety', 'caution', 'Different draws give the same answer.'],
  'answer-equals-given': ['variety', 'note', 'The answer is printed in the question on some draw.'],
  'answers-shared': ['variety', 'note', 'Answers of different draws often earn each other’s mark.'],
  'equal-givens': ['variety', 'note', 'Two printed values can be taken for each other unseen.'],
  // print
  'hole-mistake': ['print', 'blocker', 'A value would be missing from the printed text.'],
  'maths-mistake': ['print', 'blocker', 'The formula cannot be printed.'],
  'unit-mismatch': ['print', 'blocker', 'The answer’s unit does not fit its quantity.'],
  'answer-missing': ['print', 'blocker', 'The part names no quantity of the script.'],
  'marks-do-not-add-up': ['print', 'blocker', 'The mark scheme gives more or fewer marks than the part.'],
  'alternative-text-missing': ['print', 'blocker', 'A candidate who cannot see the figure is shut out.'],
  'figure-missing': ['print', 'blocker', 'The figure stands nowhere in the item.'],
  'value-not-stated': ['print', 'caution', 'A part that shows a value should state it.'],
  'awkward-number': ['print', 'note', 'Numbers from 0.1 to 1000 in their unit read best.'],
  'answer-printed': ['print', 'caution', 'The candidate can copy the answer from the paper.'],
  'printed-in-full': ['print', 'caution', 'The answers do not follow from what is printed.'],
  'show-that-figures': ['print', 'caution', 'A value shown must be finer than the value stated.'],
  'ambiguous-zeros': ['print', 'note', 'Figures are enforced that the givens leave open.'],
  'text-empty': ['print', 'caution', 'The part asks nothing.'],
} as const satisfies Record<string, readonly [Check, Severity, string]>;

export type FindingCode = keyof typeof SEVERITY_TABLE;
