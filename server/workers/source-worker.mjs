// Runs a worker's TypeScript source as it stands, for development and tests: a thread does not inherit the
// loader of the process that started it. The bundle has no need of this.
import { workerData } from 'node:worker_threads';

import { register } from 'tsx/esm/api';

register();
const source = await import(workerData.source);

export default source.default;
