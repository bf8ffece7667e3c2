/** The engine's public face: the only file of this folder that others import. */
export type * from './diagnostics/diagnostic.ts';
export {
  dimension,
  DIMENSIONLESS,
  divideDimensions,
  isDimensionless,
  multiplyDimensions,
  powerOfDimension,
  sameDimension,
  type Dimension,
  type Rational,
} from './units/dimension.ts';
export type * from './units/unit.ts';
export { NO_UNIT } from './units/unit.ts';
export { readUnit, type UnitReading } from './units/read-unit.ts';
export { convert, fromSI, toSI } from './units/convert.ts';
export {
  formatNumber,
  formatQuantity,
  type PrintedNumber,
  type PrintedQuantity,
  type PrintPrecision,
} from './units/format.ts';
export { roundToDecimals, roundToFigures } from './units/rounding.ts';
export { describeDimension } from './units/quantity-kinds.ts';
export { CONSTANTS, type PhysicalConstant } from './physics/constants.ts';
export type * from './script/expression-tree.ts';
export type * from './script/statement.ts';
export { describeNames, type NameDescription } from './script/describe-names.ts';
export type * from './compile/compiled-script.ts';
export { compileScript } from './compile/compile-script.ts';
export { evaluateBlock, evaluateDraw } from './compile/evaluate.ts';
export {
  buildExpression,
  compileExpression,
  evaluateExpression,
  type CompiledExpression,
  type ExpressionCompilation,
} from './compile/expressions.ts';
export { workingOf } from './compile/working.ts';
export { expressionText } from './script/expression-text.ts';
export { dependenciesOf, type Dependencies } from './compile/dependencies.ts';
export { coverageStatement } from './draws/coverage.ts';
export { EXHAUSTIVE_LIMIT, firstKeptDraw, planDraws, randomDraw, type DrawPlan } from './draws/sampling.ts';
export { readResponse, type ResponseReading } from './responses/read-response.ts';
export {
  markResponse,
  type MarkingTarget,
  type Verdict,
  type VerdictKind,
  type WrongWorking,
} from './responses/mark-response.ts';
export {
  ASSUMPTIONS,
  CLAIMS,
  isNumericPart,
  ITEM_CONTENT_SCHEMA,
  ITEM_LIMITS,
  itemContentSchema,
  partLetter,
  type Answer,
  type Band,
  type ItemContent,
  type ItemFigure,
  type NumericPart,
  type Part,
  type Quantity,
  type SchemeLine,
  type Slip,
} from './item/content.ts';
export {
  assayReportSchema,
  CHECKS,
  SEVERITIES,
  worstSeverity,
  type AssayReport,
  type Check,
  type Distribution,
  type Finding,
  type PartScale,
  type Severity,
  type StripMark,
} from './assay/report.ts';
export { findHoles, type Hole, type HoleMistake } from './holes/find-holes.ts';
export {
  holeProblem,
  printingOf,
  printSeries,
  printValue,
  type HoleContext,
  type HolePrinting,
} from './holes/fill-hole.ts';
export { answerBand, type AnswerBand } from './assay/answer-band.ts';
export { assayedHash, assayItem, ENGINE_VERSION, type AssayOptions } from './assay/assay-item.ts';
export { canonicalJson } from './assay/content-hash.ts';
export type { FigureFacts } from './assay/context.ts';
export { SEVERITY_TABLE, type FindingCode } from './assay/severity.ts';
export { TIDY_PERCENTS } from './assay/recommend-band.ts';
export { LAWS } from './physics/laws.ts';
export { findRole, ROLES_OF_QUANTITIES, type RoleRow } from './physics/roles.ts';
