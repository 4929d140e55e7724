'use client';

import { createContext, useContext, type ReactNode } from 'react';
import type { Me } from '@/lib/domain/people/schema';
import { rolesCarry, type Permission } from '@/lib/domain/people/roles';

type Membership = Me['organisations'][number];
interface OrganisationScope { email: string; organisation: Membership; organisations: readonly Membership[] }

const Scope = createContext<OrganisationScope | null>(null);

export function OrganisationProvider({ scope, children }: { scope: OrganisationScope; children: ReactNode }) {
  return <Scope value={scope}>{children}</Scope>;
}

/** Who is looking, in which organisation, and what their roles carry there. */
export function useOrganisation() {
  const scope = useContext(Scope);
  if (!scope) throw new Error('useOrganisation is for pages of an organisation.');
  const { email, organisation, organisations } = scope;
  return { email, organisations, ...organisation, may: (permission: Permission) => rolesCarry(organisation.roles, permission) };
}
