import { route } from '@/app/_server/route';
import { createTokenContract, listTokensContract } from '@/lib/domain/tokens/schema';
import { createToken } from '@/lib/services/tokens/create-token';
import { listTokens } from '@/lib/services/tokens/list-tokens';

export const POST = route(createTokenContract, ({ ctx, body }) => createToken(ctx, body));
export const GET = route(listTokensContract, ({ ctx, query }) => listTokens(ctx, query));
