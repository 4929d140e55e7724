import { route } from '@/app/_server/route';
import { assessContract } from '@/lib/domain/assessment/quick-schema';
import { assessTable } from '@/lib/services/assessment/assess-table';

export const POST = route(assessContract, ({ ctx, address, body }) => assessTable(ctx, address, body));
