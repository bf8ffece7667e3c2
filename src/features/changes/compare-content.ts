import { diffLines, diffWordsWithSpace } from 'diff';

import { partLetter, type ItemContent, type Part } from '#shared/engine/index.ts';
import { bandWords } from './band-words.ts';

/** A run of text that both versions have, or that only one has. */
export interface Run {
  kind: 'same' | 'added' | 'removed';
  text: string;
}

/** One thing that changed between two versions of an item, in the order of the sheet. */
export type Change = { key: string; label: string } & (
  | { kind: 'words'; runs: Run[] }
  | { kind: 'lines'; runs: Run[] }
  | { kind: 'value'; before: string; after: string }
  | { kind: 'sentence'; sentence: string }
);

function runs(parts: { added: boolean; removed: boolean; value: string }[]): Run[] {
  return parts.map(({ added, removed, value }) => ({
    kind: added ? 'added' : removed ? 'removed' : 'same',
    text: value,
  }));
}

class ChangeList {
  readonly changes: Change[] = [];

  words(key: string, label: string, before: string, after: string): void {
    if (before === after) return;
    this.changes.push({ key, label, kind: 'words', runs: runs(diffWordsWithSpace(before, after)) });
  }

  lines(key: string, label: string, before: string, after: string): void {
    if (before === after) return;
    const ended = (text: string): string => (text === '' || text.endsWith('\n') ? text : `${text}\n`);
    this.changes.push({ key, label, kind: 'lines', runs: runs(diffLines(ended(before), ended(after))) });
  }

  value(key: string, label: string, before: string, after: string): void {
    if (before === after) return;
    const shown = (text: string): string => (text === '' ? 'nothing' : text);
    this.changes.push({ key, label, kind: 'value', before: shown(before), after: shown(after) });
  }

  sentence(key: string, label: string, sentence: string): void {
    this.changes.push({ key, label, kind: 'sentence', sentence });
  }
}

const KINDS: Readonly<Record<Part['kind'], string>> = {
  numeric: 'numeric',
  showThat: 'show that',
  written: 'written',
};
const yesNo = (value: boolean): string => (value ? 'yes' : 'no');
const schemeText = (part: Part): string =>
  part.scheme.map((line) => `${line.text} [${line.marks}]\n`).join('');

function compareAnswers(list: ChangeList, key: string, label: string, before: Part, after: Part): void {
  if (before.kind === 'written' || after.kind === 'written') return;
  const [was, now] = [before.answer, after.answer];
  list.value(`${key}.quantity`, `${label}, answer`, was.quantity, now.quantity);
  list.value(`${key}.unit`, `${label}, unit`, was.unit, now.unit);
  list.value(`${key}.figures`, `${label}, figures wanted`, String(was.figures), String(now.figures));
  list.value(
    `${key}.enforce`,
    `${label}, figures enforced`,
    yesNo(was.enforceFigures),
    yesNo(now.enforceFigures),
  );
  list.value(`${key}.band`, `${label}, band`, bandWords(was.band), bandWords(now.band));
  list.value(
    `${key}.carry`,
    `${label}, error carried forward`,
    yesNo(was.carryForward),
    yesNo(now.carryForward),
  );
  if (before.kind === 'showThat' && after.kind === 'showThat') {
    list.value(
      `${key}.stated`,
      `${label}, figures stated`,
      String(before.statedFigures),
      String(after.statedFigures),
    );
  }
  const ids = [...new Set([...was.slips, ...now.slips].map((slip) => slip.id))];
  for (const id of ids) {
    const slipWords = (slips: typeof was.slips): string => {
      const slip = slips.find((one) => one.id === id);
      if (slip === undefined) return '';
      return `${slip.name}: ${slip.expression} [${slip.marks}] ${slip.guidance}`.trim();
    };
    list.words(`${key}.slip.${id}`, `${label}, slip`, slipWords(was.slips), slipWords(now.slips));
  }
}

function compareParts(list: ChangeList, before: ItemContent, after: ItemContent): void {
  after.parts.forEach((part, index) => {
    const label = `Part (${partLetter(index)})`;
    const wasAt = before.parts.findIndex((one) => one.id === part.id);
    const was = before.parts[wasAt];
    if (was === undefined) {
      list.words(`${part.id}.added`, `${label}, new`, '', part.text);
      return;
    }
    if (wasAt !== index)
      list.value(`${part.id}.place`, label, `(${partLetter(wasAt)})`, `(${partLetter(index)})`);
    list.value(`${part.id}.kind`, `${label}, kind`, KINDS[was.kind], KINDS[part.kind]);
    list.words(`${part.id}.text`, `${label}, text`, was.text, part.text);
    list.value(`${part.id}.marks`, `${label}, marks`, String(was.marks), String(part.marks));
    compareAnswers(list, part.id, label, was, part);
    list.lines(`${part.id}.scheme`, `${label}, mark scheme`, schemeText(was), schemeText(part));
  });
  before.parts.forEach((part, index) => {
    if (after.parts.some((one) => one.id === part.id)) return;
    list.words(`${part.id}.removed`, `Part (${partLetter(index)}) before, taken out`, part.text, '');
  });
}

function compareQuantities(list: ChangeList, before: ItemContent, after: ItemContent): void {
  const words = (content: ItemContent, name: string): string => {
    const quantity = content.quantities.find((one) => one.name === name);
    if (quantity === undefined) return '';
    const { symbol, unit, figures, role, set } = quantity;
    return [
      symbol,
      unit,
      figures === null ? '' : `${figures} s.f.`,
      role ?? '',
      set === '' ? '' : `set ${set}`,
    ]
      .filter((text) => text !== '')
      .join(', ');
  };
  const names = [...new Set([...before.quantities, ...after.quantities].map((quantity) => quantity.name))];
  for (const name of names) {
    list.value(`quantity.${name}`, `Quantity ${name}`, words(before, name), words(after, name));
  }
}

function compareFigures(list: ChangeList, before: ItemContent, after: ItemContent): void {
  const ids = [...new Set([...before.figures, ...after.figures].map((figure) => figure.figureId))];
  ids.forEach((id, index) => {
    const was = before.figures.find((figure) => figure.figureId === id);
    const now = after.figures.find((figure) => figure.figureId === id);
    const label = `Figure ${index + 1}`;
    const told = (text: string | undefined): string =>
      text === undefined || text === '' ? 'no description' : text;
    if (was === undefined) {
      list.sentence(`figure.${id}`, label, `Added: ${told(now?.alternativeText)}`);
    } else if (now === undefined) {
      list.sentence(`figure.${id}`, label, `Taken off: ${told(was.alternativeText)}`);
    } else {
      list.words(`figure.${id}.text`, `${label}, description`, was.alternativeText, now.alternativeText);
      list.words(`figure.${id}.caption`, `${label}, caption`, was.caption, now.caption);
      list.value(`figure.${id}.width`, `${label}, width`, `${was.widthPercent} %`, `${now.widthPercent} %`);
      list.value(`figure.${id}.place`, `${label}, place`, was.place, now.place);
    }
  });
}

/** What changed from one version of an item to a later one; empty when nothing did. */
export function compareContent(before: ItemContent, after: ItemContent): Change[] {
  const list = new ChangeList();
  list.words('title', 'Title', before.title, after.title);
  list.words('stem', 'Stem', before.stem, after.stem);
  list.lines('script', 'Script', before.script, after.script);
  compareParts(list, before, after);
  compareQuantities(list, before, after);
  compareFigures(list, before, after);
  list.value('assumptions', 'Assumptions', before.assumptions.join(', '), after.assumptions.join(', '));
  list.value('claims', 'Claims', before.claims.join(', '), after.claims.join(', '));
  list.value('practical', 'Practical work', yesNo(before.practical), yesNo(after.practical));
  return list.changes;
}
