import { AppError } from '#shared/errors/app-error.ts';

/**
 * Runs `work`; when it fails with a conflict, the failure goes on with what the server holds now, in the shape
 * of the resource's own contract. `current` is asked for after the work's transaction has ended.
 */
export async function tellingCurrent<Result>(
  work: () => Promise<Result>,
  current: () => Promise<unknown>,
): Promise<Result> {
  try {
    return await work();
  } catch (error) {
    if (!(error instanceof AppError) || error.code !== 'conflict') throw error;
    throw new AppError('conflict', error.message, { current: await current(), cause: error });
  }
}
