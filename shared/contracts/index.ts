/** Every resource's endpoints by name; tests walk this to try each route with each role. */
export * as checking from './checking.ts';
export * as desk from './desk.ts';
export * as figures from './figures.ts';
export * as health from './health.ts';
export * as items from './items.ts';
export * as papers from './papers.ts';
export * as people from './people.ts';
export * as records from './records.ts';
export * as reviews from './reviews.ts';
export * as session from './session.ts';
export * as topics from './topics.ts';
