import type { PhrasingContent, RootContent } from 'mdast';
import remarkGfm from 'remark-gfm';
import remarkMath from 'remark-math';
import remarkParse from 'remark-parse';
import { unified } from 'unified';

import type { Block, Inline } from './model.ts';

const processor = unified().use(remarkParse).use(remarkGfm).use(remarkMath);

/** Characters of the private use area that stand for hole number n while Markdown is read. */
const HOLE_BASE = 0xe000;
const HOLE_RANGE = /[\uE000-\uE7FF]/g;

/** The character that stands for hole `index`; Markdown lets it through untouched. */
export function holeCharacter(index: number): string {
  return String.fromCharCode(HOLE_BASE + index);
}

/** Gives what hole `index` prints: an inline for running text, LaTeX inside maths. */
export interface HolePrinter {
  inline: (index: number) => Inline;
  latex: (index: number) => string;
}

function fillLatex(latex: string, printer: HolePrinter): string {
  return latex.replace(HOLE_RANGE, (character) => printer.latex(character.charCodeAt(0) - HOLE_BASE));
}

function textWithHoles(text: string, printer: HolePrinter): Inline[] {
  const pieces: Inline[] = [];
  let from = 0;
  for (const match of text.matchAll(HOLE_RANGE)) {
    if (match.index > from) pieces.push({ kind: 'text', text: text.slice(from, match.index) });
    pieces.push(printer.inline(match[0].charCodeAt(0) - HOLE_BASE));
    from = match.index + 1;
  }
  if (from < text.length) pieces.push({ kind: 'text', text: text.slice(from) });
  return pieces;
}

function inlinesOf(nodes: readonly PhrasingContent[], printer: HolePrinter): Inline[] {
  return nodes.flatMap((node): Inline[] => {
    switch (node.type) {
      case 'text':
        return textWithHoles(node.value, printer);
      case 'strong':
        return [{ kind: 'strong', children: inlinesOf(node.children, printer) }];
      case 'emphasis':
        return [{ kind: 'emphasis', children: inlinesOf(node.children, printer) }];
      case 'inlineMath':
        return [{ kind: 'maths', latex: fillLatex(node.value, printer) }];
      case 'inlineCode':
        return textWithHoles(node.value, printer);
      case 'break':
        return [{ kind: 'break' }];
      case 'delete':
      case 'link':
        return inlinesOf(node.children, printer);
      default:
        return [];
    }
  });
}

function blocksOf(nodes: readonly RootContent[], printer: HolePrinter): Block[] {
  return nodes.flatMap((node): Block[] => {
    switch (node.type) {
      case 'paragraph':
      case 'heading':
        return [{ kind: 'paragraph', children: inlinesOf(node.children, printer) }];
      case 'math':
        return [{ kind: 'maths', latex: fillLatex(node.value, printer) }];
      case 'list':
        return [
          {
            kind: 'list',
            ordered: node.ordered === true,
            items: node.children.map((item) => blocksOf(item.children, printer)),
          },
        ];
      case 'table': {
        const rows = node.children.map((row) =>
          row.children.map((cell) => inlinesOf(cell.children, printer)),
        );
        return [{ kind: 'table', header: rows[0] ?? [], rows: rows.slice(1) }];
      }
      case 'blockquote':
        return blocksOf(node.children, printer);
      case 'code':
        return [{ kind: 'paragraph', children: textWithHoles(node.value, printer) }];
      default:
        return [];
    }
  });
}

/**
 * Reads Markdown with maths into blocks. Holes are given as the characters of `holeCharacter`. Raw HTML and
 * pictures are left out: figures have a place of their own in the item.
 */
export function readMarkdown(markdown: string, printer: HolePrinter): Block[] {
  return blocksOf(processor.parse(markdown).children, printer);
}
