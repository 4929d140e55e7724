import { insertRelease } from '@/db/queries/releases';
import type { CreateReleaseInput, Release } from '@/lib/domain/codes/schema';
import { requireCode } from '../codes/require-code';
import type { MemberContext } from '../context';
import { newId } from '../keys';
import { permit } from '../permit';
import { refuseDuplicate } from '../unique-violation';
import { withOrganisation } from '../with-organisation';
import { mapRelease } from './map-release';

export async function createRelease(ctx: MemberContext, codeKey: string, input: CreateReleaseInput): Promise<Release> {
  permit(ctx, 'work.write');
  const detail = `Release “${input.version}” is already there. Choose another version.`;
  const row = await refuseDuplicate('releases_version_key', 'version', detail, () =>
    withOrganisation(ctx, async (trx) => {
      const code = await requireCode(ctx, trx, codeKey);
      return insertRelease(trx, {
        organisation_id: ctx.organisation.id, id: newId(), code_id: code.id, version: input.version, commit: input.commit ?? null, created_by: ctx.userId,
      });
    }),
  );
  return mapRelease(row);
}
