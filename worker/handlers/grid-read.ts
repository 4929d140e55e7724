import { readGridFile } from '@/lib/services/reading/read-grid-file';
import type { JobHandler } from '../job-handler';

export const handleGridRead: JobHandler = (ctx, { subjectId }, { reader }) => readGridFile(ctx, subjectId, reader);
