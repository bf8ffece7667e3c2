import { availableParallelism } from 'node:os';

/** How many test files run at once; each worker of the integration tests has a database of its own. */
export const workerCount = Math.min(4, Math.max(1, availableParallelism()));
