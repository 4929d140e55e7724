import { AppError } from '@/lib/errors';
import { rolesCarry, type Permission } from '@/lib/domain/people/roles';
import type { MemberContext } from './context';

/** Which role lets through; the first that anybody can be given. */
const roleFor: Record<Permission, string> = {
  'work.read': 'engineer', 'work.write': 'engineer', 'tokens.manage': 'engineer', 'people.read': 'engineer', 'people.manage': 'owner',
};

/** Refuses what the caller's roles or token do not carry; to an auditor everything unsigned is simply not there. */
export function permit(ctx: MemberContext, permission: Permission): void {
  if (ctx.roles.includes('auditor')) throw new AppError('not-found', 'There is nothing here, or not for you.');
  if (ctx.token && permission === 'tokens.manage') throw new AppError('not-allowed', 'A token cannot manage tokens. Sign in.');
  if (ctx.token && permission.startsWith('people.')) throw new AppError('not-allowed', 'A token cannot reach members, invitations or the organisation. Sign in.');
  const scope = permission === 'work.write' ? 'write' : 'read';
  if (ctx.token && !ctx.token.scopes.includes(scope)) {
    throw new AppError('not-allowed', `The token “${ctx.token.name}” has no scope ${scope}. Make one that has it.`);
  }
  if (!rolesCarry(ctx.roles, permission)) {
    throw new AppError('not-allowed', `This needs the role ${roleFor[permission]}. You are ${ctx.roles.join(' and ')} in ${ctx.organisation.name}.`);
  }
}

/** A token limited to a code sees nothing of any other. */
export function permitCode(ctx: MemberContext, codeId: string): void {
  if (ctx.token?.codeId && ctx.token.codeId !== codeId) throw new AppError('not-found', 'There is nothing here, or not for this token.');
}
