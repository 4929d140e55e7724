import { setTimeout as pause } from 'node:timers/promises';
import { findAssessment } from '@/db/queries/assessments';
import { listGrids } from '@/db/queries/grids';
import type { Assessment } from '@/lib/domain/assessment/schema';
import { describeRejection } from '@/lib/domain/uploads/rejection-text';
import type { RejectionReason } from '@/lib/domain/uploads/rejection';
import type { OutcomeAnswer, StudyState } from '@/lib/domain/studies/schema';
import { AppError } from '@/lib/errors';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { withOrganisation, type Trx } from '../with-organisation';
import { requireStudy, type LoadedStudy } from './require-study';

/** A look at the database needs no queue to be there; the longer it takes, the seldomer it is looked. */
const polls = { first: 300, longest: 1500, growth: 1.4 };

export type OutcomeReading = { state: 'assessed'; answer: OutcomeAnswer } | { state: StudyState; answer: null };

async function refuseRejected(trx: Trx, { at }: LoadedStudy): Promise<void> {
  const rejected = (await listGrids(trx, at)).filter((grid) => grid.state === 'rejected' && grid.excluded === null);
  if (rejected.length === 0) return;
  throw new AppError('wrong-state', `Rejected: ${rejected.map(({ label }) => label).join(', ')}. Send another file for each, or leave it out with a reason.`, {
    fields: rejected.flatMap(({ label, reasons }) => (reasons as unknown as RejectionReason[])
      .map((reason) => ({ path: `grids.${label}`, message: describeRejection(reason).sentence }))),
  });
}

async function readOutcome(ctx: MemberContext, id: string): Promise<OutcomeReading> {
  return withOrganisation(ctx, async (trx) => {
    const loaded = await requireStudy(ctx, trx, id);
    const { head, bound, at } = loaded;
    if (bound.state === 'assessment-failed') {
      throw new AppError('wrong-state', `The assessment failed. ${bound.failure ?? ''}`.trim(), { fields: [{ path: 'assessment', message: bound.failure ?? 'It failed.' }] });
    }
    if (bound.state === 'abandoned') throw new AppError('wrong-state', 'The study was abandoned and has no outcome.');
    if (bound.state === 'collecting') await refuseRejected(trx, loaded);
    const assessment = (await findAssessment(trx, at))?.body as unknown as Assessment | undefined;
    if (!assessment || bound.state === 'assessing') return { state: bound.state as StudyState, answer: null };
    const answer = {
      study: head.id, revision: at.revision, code: head.code_slug, release: head.release_version, case: head.case_slug,
      outcome: assessment.outcome, reasons: assessment.reasons, assessment,
    };
    return { state: 'assessed', answer };
  });
}

/** The outcome of the current revision, waiting for it as long as asked; refused where it cannot come by itself. */
export async function getOutcome(ctx: MemberContext, id: string, waitSeconds: number, signal: AbortSignal): Promise<OutcomeReading> {
  permit(ctx, 'work.read');
  const deadline = Date.now() + waitSeconds * 1000;
  let reading = await readOutcome(ctx, id);
  let poll = polls.first;
  while (reading.answer === null && Date.now() < deadline && !signal.aborted) {
    await pause(Math.min(poll, deadline - Date.now()), undefined, { signal }).catch(() => undefined);
    poll = Math.min(poll * polls.growth, polls.longest);
    reading = await readOutcome(ctx, id);
  }
  return reading;
}
