'use client';

import { createContext, useContext, useEffect, type ReactNode } from 'react';
import type { Me } from '@/lib/domain/people/schema';
import { rolesCarry, type Permission } from '@/lib/domain/people/roles';
import { rememberOrganisation } from './last-organisation';

type Membership = Me['organisations'][number];
interface OrganisationScope { userId: string; email: string; organisation: Membership; organisations: readonly Membership[] }

const Scope = createContext<OrganisationScope | null>(null);

export function OrganisationProvider({ scope, children }: { scope: OrganisationScope; children: ReactNode }) {
  const { slug } = scope.organisation;
  useEffect(() => rememberOrganisation(slug), [slug]);
  return <Scope value={scope}>{children}</Scope>;
}

/** Who is looking, in which organisation, and what their roles carry there. */
export function useOrganisation() {
  const scope = useContext(Scope);
  if (!scope) throw new Error('useOrganisation is for pages of an organisation.');
  const { userId, email, organisation, organisations } = scope;
  return { userId, email, organisations, ...organisation, may: (permission: Permission) => rolesCarry(organisation.roles, permission) };
}
