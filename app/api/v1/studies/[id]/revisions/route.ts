import { route } from '@/app/_server/route';
import { reviseStudyContract } from '@/lib/domain/studies/schema';
import { reviseStudy } from '@/lib/services/studies/revise-study';

export const POST = route(reviseStudyContract, ({ ctx, params }) => reviseStudy(ctx, params.id));
