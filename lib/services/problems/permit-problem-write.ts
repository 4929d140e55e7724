import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { permit } from '../permit';

/** Problems are shared by all codes, so a token limited to one may read them only. */
export function permitProblemWrite(ctx: MemberContext): void {
  permit(ctx, 'work.write');
  if (ctx.token?.codeId) throw new AppError('not-allowed', `The token “${ctx.token.name}” is limited to one code and cannot make or change problems.`);
}
