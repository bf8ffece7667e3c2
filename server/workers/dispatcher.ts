import type { MessagePort } from 'node:worker_threads';

/** One call of a task as it travels to a thread. */
export interface TaskCall {
  task: string;
  payload: unknown;
  /** Told when a thread takes the call up. */
  started: MessagePort;
}

/** The function that a worker file exports by default: it runs the task that a call names. */
export function dispatcher(
  tasks: Readonly<Record<string, (payload: never) => unknown>>,
): (call: TaskCall) => unknown {
  return ({ task, payload, started }) => {
    started.postMessage('started');
    started.close();
    const run = tasks[task];
    if (run === undefined) throw new Error(`There is no task ${task} in this worker.`);
    return run(payload as never);
  };
}
