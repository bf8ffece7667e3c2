import type { BlockValues } from '../compile/compiled-script.ts';
import type { AssayContext } from './context.ts';
import type { Finding } from './report.ts';
import { SEVERITY_TABLE, type FindingCode } from './severity.ts';

/** One check at work: it sees every assayed draw, block by block, and then tells what it found. */
export interface RunningCheck {
  /** Kept draws have `kept` 1; the others are passed over. */
  visit?: (block: BlockValues) => void;
  finish: () => Finding[];
}

export type CheckStart = (context: AssayContext) => RunningCheck;

const MOST_OTHER_DRAWS = 5;

/** Counts the draws that show a fault and remembers the worst and a few others. */
export class Tally {
  count = 0;
  worstDraw: number | null = null;
  worstBadness = -Infinity;
  private readonly seen: number[] = [];

  add(draw: number, badness: number): void {
    this.count += 1;
    if (this.seen.length <= MOST_OTHER_DRAWS) this.seen.push(draw);
    if (badness > this.worstBadness) {
      this.worstBadness = badness;
      this.worstDraw = draw;
    }
  }

  get otherDraws(): number[] {
    return this.seen.filter((draw) => draw !== this.worstDraw).slice(0, MOST_OTHER_DRAWS);
  }
}

interface FindingParts {
  statement: string;
  cure: string;
  place?: Finding['place'];
  tally?: Tally;
  /** Tells findings of one code apart; part of the key by which a caution is accepted. */
  about?: string;
}

/** A finding with check and severity from the severity table. */
export function finding(code: FindingCode, parts: FindingParts): Finding {
  const [check, severity] = SEVERITY_TABLE[code];
  return {
    key: parts.about === undefined ? code : `${code}:${parts.about}`,
    check,
    code,
    severity,
    statement: parts.statement,
    cure: parts.cure,
    place: parts.place ?? {},
    worstDraw: parts.tally?.worstDraw ?? null,
    otherDraws: parts.tally?.otherDraws ?? [],
    drawCount: parts.tally?.count ?? 0,
  };
}

/** As "1 draw" or "320 draws". */
export function drawsInWords(count: number): string {
  return count === 1 ? '1 draw' : `${count.toLocaleString('en-GB')} draws`;
}

/** As "1 draw shows it" or "320 draws show it". */
export function drawsShow(count: number): string {
  return `${drawsInWords(count)} ${count === 1 ? 'shows' : 'show'} it`;
}

/** A relative size in words: as "0.57 %", "120 %", or "200 times". */
export function shareInWords(share: number): string {
  const size = Math.abs(share);
  if (size >= 10) {
    return size >= 1e4 ? 'over ten thousand times' : `${Math.round(size).toLocaleString('en-GB')} times`;
  }
  return size >= 1 ? `${Math.round(size * 100)} %` : `${Number((size * 100).toPrecision(2))} %`;
}
