import type { Role } from './roles';

/** Roles in a sentence: owner, engineer and reviewer. */
export function roleWords(roles: readonly Role[]): string {
  const last = roles.at(-1);
  if (last === undefined) return 'no role';
  return roles.length === 1 ? last : `${roles.slice(0, -1).join(', ')} and ${last}`;
}
