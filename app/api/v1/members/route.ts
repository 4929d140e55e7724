import { route } from '@/app/_server/route';
import { listMembersContract } from '@/lib/domain/members/schema';
import { listMembers } from '@/lib/services/members/list-members';

export const GET = route(listMembersContract, ({ ctx, query }) => listMembers(ctx, query));
