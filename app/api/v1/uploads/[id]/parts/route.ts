import { route } from '@/app/_server/route';
import { signPartsContract } from '@/lib/domain/uploads/schema';
import { signParts } from '@/lib/services/uploads/sign-parts';

export const POST = route(signPartsContract, ({ ctx, params, body }) => signParts(ctx, params.id, body));
