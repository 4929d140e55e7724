import { assessQuickCheck } from '@/lib/domain/assessment/quick-check';
import type { QuickCheckInput } from '@/lib/domain/assessment/quick-schema';
import type { Assessment } from '@/lib/domain/assessment/schema';
import { AppError } from '@/lib/errors';
import type { Context } from '../context';
import { hashInputs } from './hash-inputs';

/** Assesses a small table for anybody; nothing is kept. */
export async function assessTable(ctx: Context, address: string, input: QuickCheckInput): Promise<Assessment> {
  await ctx.limits.take('calculator', address);
  const result = assessQuickCheck(input);
  if (!result.ok) throw new AppError('invalid', result.faults[0]?.message ?? 'The table is not valid.', { fields: result.faults });
  const { assessment } = result;
  return { ...assessment, inputs: [], inputsSha256: hashInputs({ request: input, numericsVersion: assessment.numericsVersion }) };
}
