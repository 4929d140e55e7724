import { checkCase } from '@/lib/domain/cases/check-case';
import type { CaseDefinition, CaseKind } from '@/lib/domain/cases/definition';
import { notYetOfCase } from '@/lib/domain/cases/not-yet';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { refuseFaults, refuseNotYet } from '../refuse';

/** `problem` is the definition as stored. */
export function checkCaseDefinition(definition: CaseDefinition, kind: CaseKind, problem: unknown): void {
  refuseNotYet(notYetOfCase(definition));
  refuseFaults(checkCase(definition, problemDefinitionSchema.parse(problem), kind));
}
