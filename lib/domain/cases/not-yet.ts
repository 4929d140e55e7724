import type { NotAvailableYet } from '../api/not-yet';
import type { CaseDefinition, DeclaredField, DeclaredNorm } from './definition';

type Asked = NotAvailableYet | false;

/** The first member that asks for what is not available yet. */
export function notYetOfCase(definition: CaseDefinition): NotAvailableYet | null {
  const asked: Asked[] = [
    ...definition.fields.flatMap((field, index) => askedByField(field, `fields.${index}`)),
  ];
  return asked.find((each) => each !== false) ?? null;
}

function askedByField({ norms }: DeclaredField, path: string): Asked[] {
  return norms.flatMap((norm, index) => askedByNorm(norm, `${path}.norms.${index}`));
}

function askedByNorm({ backing }: DeclaredNorm, path: string): Asked[] {
  return [
    backing !== undefined && 'scheme' in backing && { path: `${path}.backing.scheme`, what: 'Backing by a scheme' },
  ];
}
