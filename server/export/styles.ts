import { AlignmentType, type IStylesOptions, LineRuleType } from 'docx';

/** Half-points, as Word counts type sizes. */
const BODY = 22;
/** Twentieths of a point, as Word counts distances: one millimetre. */
export const MILLIMETRE = 56.7;

export const PAGE = {
  /** A4. */
  width: Math.round(210 * MILLIMETRE),
  height: Math.round(297 * MILLIMETRE),
  margin: Math.round(22 * MILLIMETRE),
} as const;

/** Width between the margins. */
export const TEXT_WIDTH = PAGE.width - 2 * PAGE.margin;
/** Where the text of a lettered part begins. */
export const PART_INDENT = Math.round(10 * MILLIMETRE);
/** Pixels of the text width at 96 to the inch. */
export const TEXT_PIXELS = Math.round((TEXT_WIDTH / 1440) * 96);

const SERIF = 'Cambria';
const INK = '1C2733';
const SLATE = '5A6672';

/** Named styles, so that a person can restyle the document in one place. */
export const documentStyles: IStylesOptions = {
  default: {
    document: {
      run: { font: SERIF, size: BODY, color: INK, language: { value: 'en-GB' } },
      paragraph: { spacing: { after: 120, line: 276, lineRule: LineRuleType.AUTO } },
    },
    title: {
      run: { font: SERIF, size: 52, color: INK },
      paragraph: { spacing: { before: 240, after: 120 } },
    },
    heading1: {
      run: { font: SERIF, size: 28, bold: true, color: INK },
      paragraph: { spacing: { before: 360, after: 120 }, keepNext: true },
    },
    heading2: {
      run: { font: SERIF, size: 24, bold: true, color: INK },
      paragraph: { spacing: { before: 240, after: 100 }, keepNext: true },
    },
  },
  paragraphStyles: [
    {
      id: 'Organisation',
      name: 'Organisation',
      basedOn: 'Normal',
      run: { size: 24, color: SLATE, characterSpacing: 20 },
    },
    { id: 'Subtitle', name: 'Subtitle', basedOn: 'Normal', run: { size: 28, color: SLATE } },
    { id: 'StemText', name: 'Stem', basedOn: 'Normal', paragraph: { keepLines: true } },
    {
      id: 'PartText',
      name: 'Part',
      basedOn: 'Normal',
      paragraph: {
        indent: { left: PART_INDENT, hanging: PART_INDENT },
        spacing: { before: 160 },
        keepLines: true,
      },
    },
    {
      id: 'PartContinued',
      name: 'Part continued',
      basedOn: 'Normal',
      paragraph: { indent: { left: PART_INDENT }, keepLines: true },
    },
    {
      id: 'WritingLine',
      name: 'Writing line',
      basedOn: 'Normal',
      paragraph: {
        indent: { left: PART_INDENT },
        spacing: { before: 0, after: 0, line: 440, lineRule: LineRuleType.AT_LEAST },
      },
    },
    {
      id: 'AnswerLine',
      name: 'Answer line',
      basedOn: 'Normal',
      paragraph: { indent: { left: PART_INDENT }, spacing: { before: 160, after: 200 } },
    },
    {
      id: 'FigureCaption',
      name: 'Figure caption',
      basedOn: 'Normal',
      run: { size: 19, color: SLATE },
      paragraph: { alignment: AlignmentType.CENTER },
    },
    {
      id: 'Caution',
      name: 'Caution',
      basedOn: 'Normal',
      run: { size: 20 },
      paragraph: { indent: { left: PART_INDENT } },
    },
    {
      id: 'TableText',
      name: 'Table text',
      basedOn: 'Normal',
      paragraph: { spacing: { before: 40, after: 40 } },
    },
    { id: 'RunningLine', name: 'Running line', basedOn: 'Normal', run: { size: 17, color: SLATE } },
  ],
};
