/** One name that the editor can complete or explain. */
export interface NameDescription {
  name: string;
  kind: 'constant' | 'function' | 'unit' | 'drawing';
  /** For a constant or unit: what it measures, as `mass (kg)`; for a function its signature. */
  detail: string;
  /** One line that says what it is. */
  description: string;
}

/** Every constant, function, drawing statement and common unit that a script may use. */
export function describeNames(): NameDescription[] {
  throw new Error('no names yet');
}
