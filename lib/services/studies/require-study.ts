import { findStudy, type StudyHead } from '@/db/queries/studies';
import { findBoundRevision, lockStudyRevision, type BoundRevision, type RevisionKey } from '@/db/queries/study-revisions';
import type { StudyState } from '@/lib/domain/studies/schema';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { keyOf } from '../keys';
import { permitCode } from '../permit';
import type { Trx } from '../with-organisation';

export interface LoadedStudy { head: StudyHead; bound: BoundRevision; at: RevisionKey }

/** A study in its current revision or a named one, or 404. */
export async function requireStudy(ctx: MemberContext, trx: Trx, id: string, revision?: number): Promise<LoadedStudy> {
  const head = await requireHead(ctx, trx, id);
  const at = { organisationId: ctx.organisation.id, studyId: head.id, revision: revision ?? head.revision };
  const bound = await findBoundRevision(trx, at);
  if (!bound) throw new AppError('not-found', `The study has no revision ${at.revision}; the latest is ${head.revision}.`);
  return { head, bound, at };
}

/** The current revision, held until the transaction ends. */
export async function lockStudy(ctx: MemberContext, trx: Trx, id: string): Promise<LoadedStudy> {
  const before = await requireHead(ctx, trx, id);
  await lockStudyRevision(trx, { organisationId: ctx.organisation.id, studyId: before.id, revision: before.revision });
  const loaded = await requireStudy(ctx, trx, id);
  if (loaded.head.revision === before.revision) return loaded;
  throw new AppError('wrong-state', 'Somebody opened a new revision at the same moment. Read the study again, then change it.');
}

const waysOn: Partial<Record<StudyState, string>> = {
  assessing: 'Its grids are being assessed. Wait for the outcome, then open a new revision to change it.',
  assessed: 'It is assessed, and an assessment never changes. Open a new revision to change it.',
  'assessment-failed': 'Its assessment failed. Run it again, or open a new revision to change it.',
};

/** The current revision, held, where it may be changed: only while collecting. */
export async function lockCollectingStudy(ctx: MemberContext, trx: Trx, id: string): Promise<LoadedStudy> {
  const loaded = await lockStudy(ctx, trx, id);
  if (loaded.bound.state === 'collecting') return loaded;
  throw new AppError('wrong-state', waysOn[loaded.bound.state as StudyState] ?? `The study is ${loaded.bound.state} and cannot be changed.`);
}

async function requireHead(ctx: MemberContext, trx: Trx, id: string): Promise<StudyHead> {
  const key = keyOf(id).id;
  const head = key === null ? undefined : await findStudy(trx, ctx.organisation.id, key);
  if (!head) throw new AppError('not-found', `There is no study “${id}”.`);
  permitCode(ctx, head.code_id);
  return head;
}
