/** A place in a text where a value of the draw is printed, as `{{Va to kV, 2 sf}}` or `{{table(f, Vs)}}`. */
export interface Hole {
  kind: 'value' | 'table';
  /** One name for a value; one for each column of a table. */
  names: string[];
  /** Unit asked for after `to`, or null. */
  unit: string | null;
  /** Significant figures asked for, or null. */
  figures: number | null;
  /** Offsets of the whole hole in the text, end exclusive. */
  start: number;
  end: number;
}

/** A hole that cannot be read. */
export interface HoleMistake {
  message: string;
  start: number;
  end: number;
}

const HOLE = /\{\{([^{}]*)\}\}/g;
const NAME = /^[A-Za-z_]\w*(\[\d+\])?$/;
const FIGURES = /^(\d{1,2})\s*(?:sf|s\.f\.|significant figures?)$/;

function readInside(inside: string, start: number, end: number): Hole | HoleMistake {
  const mistake = (message: string): HoleMistake => ({ message, start, end });
  const table = /^\s*table\s*\(([^()]*)\)\s*$/.exec(inside);
  if (table) {
    const names = (table[1] ?? '').split(',').map((name) => name.trim());
    if (names.some((name) => !NAME.test(name))) {
      return mistake('A table names its series between commas, as {{table(f, Vs)}}.');
    }
    return { kind: 'table', names, unit: null, figures: null, start, end };
  }
  const [head = '', ...rest] = inside.split(',').map((piece) => piece.trim());
  const [name = '', unit, ...more] = head.split(/\s+to\s+/);
  if (name === '') return mistake('This hole is empty: write the name of a quantity, as {{Va}}.');
  if (!NAME.test(name) || more.length > 0) {
    return mistake(`“${head}” is no name: write {{Va}}, {{Va to kV}} or {{Va to kV, 2 sf}}.`);
  }
  if (rest.length > 1) return mistake('Write at most one number of figures, as {{Va, 2 sf}}.');
  const asked = rest[0];
  if (asked === undefined)
    return { kind: 'value', names: [name], unit: unit ?? null, figures: null, start, end };
  const figures = FIGURES.exec(asked)?.[1];
  if (figures === undefined || Number(figures) < 1 || Number(figures) > 12) {
    return mistake(`“${asked}” is not a number of figures: write 1 sf to 12 sf.`);
  }
  return { kind: 'value', names: [name], unit: unit ?? null, figures: Number(figures), start, end };
}

/** Every hole of a text in order, and the mistakes among them. Braces that never close are mistakes too. */
export function findHoles(text: string): { holes: Hole[]; mistakes: HoleMistake[] } {
  const holes: Hole[] = [];
  const mistakes: HoleMistake[] = [];
  for (const match of text.matchAll(HOLE)) {
    const read = readInside(match[1] ?? '', match.index, match.index + match[0].length);
    if ('message' in read) mistakes.push(read);
    else holes.push(read);
  }
  const covered = (at: number) =>
    [...holes, ...mistakes].some((piece) => at >= piece.start && at < piece.end);
  for (const match of text.matchAll(/\{\{/g)) {
    if (covered(match.index)) continue;
    mistakes.push({
      message: 'This hole never closes: end it with }}.',
      start: match.index,
      end: match.index + 2,
    });
  }
  return { holes, mistakes };
}
