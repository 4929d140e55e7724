import type { ContractShape } from './contract';

/** With which statuses a call may be refused. */
export function problemStatuses({ method, path, access, body, query, conditional, rawBody, response, alsoRefuses = [] }: ContractShape): number[] {
  const writes = method !== 'GET';
  const statuses = new Set([500, 503]);
  const add = (applies: boolean, ...more: number[]) => {
    if (applies) more.forEach((status) => statuses.add(status));
  };
  add(access !== 'public', 401, 429);
  add(access === 'organisation', 400, 403, 404);
  add(access === 'public' && writes, 401, 409, 429);
  add(writes, 403);
  add(access === 'organisation' && writes, 409, 422);
  add(path.includes('{'), 404, 409);
  add(body !== undefined, 400, 408, 413, 422);
  add(query !== undefined, 422);
  add(rawBody === true, 408, 413);
  add(conditional === true, 412, 428);
  add(response === undefined && access === 'signed-in', 403);
  add(true, ...alsoRefuses);
  return [...statuses].sort((a, b) => a - b);
}
