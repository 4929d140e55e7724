import { createHash, randomBytes } from 'node:crypto';
import { insertApiToken } from '@/db/queries/api-tokens';
import type { CreateTokenInput, NewToken } from '@/lib/domain/tokens/schema';
import { AppError } from '@/lib/errors';
import { requireCode } from '../codes/require-code';
import type { MemberContext } from '../context';
import { newId } from '../keys';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { mapToken } from './map-token';

/** The secret is in this answer only; what is stored is its SHA-256. */
export async function createToken(ctx: MemberContext, input: CreateTokenInput): Promise<NewToken> {
  permit(ctx, 'tokens.manage');
  const expiresAt = input.expiresAt === undefined ? null : new Date(input.expiresAt);
  if (expiresAt && expiresAt <= ctx.clock()) {
    const message = `Found ${input.expiresAt}, which is past. Expected a time to come.`;
    throw new AppError('invalid', `expiresAt: ${message}`, { fields: [{ path: 'expiresAt', message }] });
  }
  const secret = `fft_${randomBytes(32).toString('base64url')}`;
  const token = await withOrganisation(ctx, async (trx) => {
    const code = input.code === undefined ? null : await requireCode(ctx, trx, input.code);
    const row = await insertApiToken(trx, {
      organisation_id: ctx.organisation.id, id: newId(), user_id: ctx.userId, code_id: code?.id ?? null, name: input.name,
      secret_sha256: createHash('sha256').update(secret).digest(), scopes: [...new Set(input.scopes)], expires_at: expiresAt,
    });
    return mapToken({ ...row, code_slug: code?.slug ?? null });
  });
  return { ...token, token: secret };
}
