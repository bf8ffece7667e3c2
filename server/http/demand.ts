import { type Action, type Actor, permit, type Subject } from '#shared/domain/permissions.ts';
import { AppError } from '#shared/errors/app-error.ts';

/**
 * Insists that `actor` may take `action` on `subject`; services ask this with the row locked.
 * Throws AppError notAllowed with the refusal as its sentence.
 */
export function demand(actor: Actor, action: Action, subject: Subject = {}): void {
  const verdict = permit(actor, action, subject);
  if (!verdict.allowed) throw new AppError('notAllowed', verdict.reason);
}
