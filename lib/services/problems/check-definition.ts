import { checkProblem } from '@/lib/domain/problems/check-problem';
import { notYetOfProblem } from '@/lib/domain/problems/not-yet';
import type { ProblemDefinition } from '@/lib/domain/problems/schema';
import { refuseFaults, refuseNotYet } from '../refuse';

export function checkProblemDefinition(definition: ProblemDefinition): void {
  refuseNotYet(notYetOfProblem(definition));
  refuseFaults(checkProblem(definition));
}
