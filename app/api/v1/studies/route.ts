import { route } from '@/app/_server/route';
import { createStudyContract, listStudiesContract } from '@/lib/domain/studies/schema';
import { createStudy } from '@/lib/services/studies/create-study';
import { listStudies } from '@/lib/services/studies/list-studies';

export const POST = route(createStudyContract, ({ ctx, body }) => createStudy(ctx, body));
export const GET = route(listStudiesContract, ({ ctx, query }) => listStudies(ctx, query));
