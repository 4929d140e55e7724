import { route } from '@/app/_server/route';
import { assessStudyContract } from '@/lib/domain/studies/schema';
import { requestAssessment } from '@/lib/services/studies/request-assessment';

export const POST = route(assessStudyContract, ({ ctx, params }) => requestAssessment(ctx, params.id));
