'use client';

import { usePathname, useRouter } from 'next/navigation';
import { useApi } from '@/app/_components/api/use-api';
import { SelectField } from '@/app/_components/forms/select-field';
import { TextField } from '@/app/_components/forms/text-field';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { Button } from '@/app/_components/ui/button';
import { listCasesContract } from '@/lib/domain/cases/schema';
import { studyStateSchema } from '@/lib/domain/studies/schema';
import type { StudiesQuery } from './studies-query';

/** States there can be before studies are reviewed and signed. */
const choosable = studyStateSchema.exclude(['in-review', 'signed', 'superseded', 'withdrawn']).options;

/** Case, release and state; a choice is a new address, so that a link shows the same list. */
export function StudyFilters({ query }: { query: StudiesQuery }) {
  const { slug } = useOrganisation();
  const path = usePathname();
  const router = useRouter();
  const cases = useApi(listCasesContract, { organisation: slug, query: { limit: 200 } });
  const go = (change: Partial<Record<'case' | 'release' | 'state', string>>) => {
    const asked = { case: query.case, release: query.release, state: query.state, ...change };
    const search = new URLSearchParams(Object.entries(asked).flatMap(([name, value]) => (value ? [[name, value]] : [])));
    router.push(search.size === 0 ? path : `${path}?${search.toString()}`);
  };
  return (
    <form
      aria-label="Filter" className="grid max-w-[844px] items-end gap-4 tablet:grid-cols-[2fr_1fr_1fr_auto]"
      onSubmit={(event) => {
        event.preventDefault();
        const release = new FormData(event.currentTarget).get('release');
        go({ release: typeof release === 'string' ? release.trim() : '' });
      }}
    >
      <SelectField label="Case" value={query.case ?? ''} onChange={(event) => go({ case: event.target.value })}>
        <option value="">every case</option>
        {(cases.data?.items ?? []).map((item) => <option key={item.id} value={item.slug}>{item.name}</option>)}
        {query.case !== undefined && !cases.data?.items.some(({ slug: each }) => each === query.case) && <option value={query.case}>{query.case}</option>}
      </SelectField>
      <SelectField label="State" value={query.state ?? ''} onChange={(event) => go({ state: event.target.value })}>
        <option value="">every state</option>
        {choosable.map((state) => <option key={state} value={state}>{state.replace('-', ' ')}</option>)}
      </SelectField>
      <TextField key={query.release} label="Release" name="release" defaultValue={query.release ?? ''} autoComplete="off" spellCheck={false} />
      <Button type="submit">Filter</Button>
    </form>
  );
}
