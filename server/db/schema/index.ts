/** Every table; drizzle-kit compares this with the last snapshot to write the next migration. */
export * from './items.ts';
export * from './papers.ts';
export * from './people.ts';
export * from './records.ts';
export * from './reviews.ts';
export * from './topics.ts';
