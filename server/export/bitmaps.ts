/** Stored pictures by the id of their figure. SVG comes with the sheet itself. */
export type Bitmaps = ReadonlyMap<number, { bytes: Uint8Array; mediaType: string }>;
