'use client';

import { useOrganisation } from './organisation-context';

/** Why somebody cannot make or change something here. */
export function NeedsEngineer({ what }: { what: string }) {
  const { roles, name } = useOrganisation();
  return <p className="text-note text-graphite">To {what} you need the role engineer. You are {roles.join(' and ')} in {name}.</p>;
}
