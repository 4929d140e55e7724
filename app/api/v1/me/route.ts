import { route } from '@/app/_server/route';
import { meContract } from '@/lib/domain/people/schema';
import { getMe } from '@/lib/services/people/get-me';

export const GET = route(meContract, ({ ctx }) => getMe(ctx));
