import type { Assessment } from '../assessment/schema';
import type { CaseDefinition, CaseKind } from '../cases/definition';
import type { ReleaseState } from '../codes/schema';
import type { StudyState } from '../studies/schema';

/** What a matrix is made of. Times are milliseconds. */
export interface MatrixRelease { id: string; version: string; state: ReleaseState; createdAt: number }

export interface MatrixCase { id: string; slug: string; name: string; kind: CaseKind; createdAt: number; definition: CaseDefinition }

export interface MatrixStudy {
  id: string; caseId: string; releaseId: string;
  /** Of the current revision. */
  revision: number; state: StudyState; gridsRead: number; gridsPlanned: number;
  /** Of the latest revision that has one. */
  assessed: { revision: number; at: number; assessment: Assessment } | null;
}
