import type { StudyState } from '@/lib/domain/studies/schema';

/** What of the list of studies is asked for, as it stands in the address. */
export interface StudiesQuery { limit: number; cursor?: string; case?: string; release?: string; state?: StudyState }
