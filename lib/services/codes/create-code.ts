import { insertCode } from '@/db/queries/codes';
import { slugFrom } from '@/lib/domain/api/names';
import type { Code, CreateCodeInput } from '@/lib/domain/codes/schema';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { newId } from '../keys';
import { permit } from '../permit';
import { refuseDuplicate } from '../unique-violation';
import { withOrganisation } from '../with-organisation';
import { mapCode } from './map-code';

export async function createCode(ctx: MemberContext, input: CreateCodeInput): Promise<Code> {
  permit(ctx, 'work.write');
  if (ctx.token?.codeId) throw new AppError('not-allowed', 'This token is limited to one code and cannot make another.');
  const slug = input.slug ?? slugFrom(input.name);
  const row = await refuseDuplicate('codes_slug_key', 'slug', `A code with the short name “${slug}” is already there. Choose another.`, () =>
    withOrganisation(ctx, (trx) =>
      insertCode(trx, { organisation_id: ctx.organisation.id, id: newId(), slug, name: input.name, created_by: ctx.userId }),
    ),
  );
  return mapCode(row);
}
