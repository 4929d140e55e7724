import { route } from '@/app/_server/route';
import { removeMemberContract, updateMemberContract } from '@/lib/domain/members/schema';
import { removeMember } from '@/lib/services/members/remove-member';
import { updateMember } from '@/lib/services/members/update-member';

export const PATCH = route(updateMemberContract, ({ ctx, params, body }) => updateMember(ctx, params.id, body));
export const DELETE = route(removeMemberContract, async ({ ctx, params }) => {
  await removeMember(ctx, params.id);
  return undefined;
});
