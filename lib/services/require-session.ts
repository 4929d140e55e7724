import { AppError } from '@/lib/errors';
import type { UserContext } from './context';

/** What is a person's own is not for their tokens. */
export function requireSession(ctx: UserContext): void {
  if (ctx.token) throw new AppError('not-allowed', 'A token cannot do this. Sign in.');
}
