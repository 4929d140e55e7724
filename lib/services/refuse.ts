import type { NotAvailableYet } from '@/lib/domain/api/not-yet';
import { AppError, notAvailable, type FieldProblem } from '@/lib/errors';

/** 422 with every fault found; the first one is told in the detail. */
export function refuseFaults(faults: FieldProblem[]): void {
  const [first] = faults;
  if (first) throw new AppError('invalid', `${first.path}: ${first.message}`, { fields: faults });
}

/** 422 naming the member that asks for what is not available yet. */
export function refuseNotYet(asked: NotAvailableYet | null): void {
  if (asked) throw notAvailable(asked.path, asked.what);
}
