import type { UseFormReturn } from 'react-hook-form';
import type { CreateCaseInput } from '@/lib/domain/cases/schema';
import type { CaseValues } from './case-values';

export type CaseForm = UseFormReturn<CaseValues, unknown, CreateCaseInput>;
