/** Bounds that make every script end in time proportional to its length; the same numbers stand in the messages. */
export const SCRIPT_LIMITS = {
  characters: 20_000,
  statements: 200,
  seriesElements: 64,
  /** Brackets within brackets. */
  nesting: 40,
  /** Words, numbers and signs in one statement. */
  tokensPerStatement: 1_000,
  /** Minus signs, powers, conditions and `not` in one statement, since these nest to the right. */
  nestedOperators: 100,
  /** Mistakes told at once; the rest wait until these are cured. */
  diagnostics: 50,
} as const;
