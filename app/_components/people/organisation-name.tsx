'use client';

import { useQueryClient } from '@tanstack/react-query';
import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { getOrganisationContract, updateOrganisationContract, updateOrganisationSchema, type Organisation } from '@/lib/domain/organisation/schema';
import { Answered } from '../api/answered';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { useApi } from '../api/use-api';
import { useSubmit } from '../api/use-submit';
import { FormActions } from '../forms/form-actions';
import { ProblemNotice } from '../forms/problem-notice';
import { TextField } from '../forms/text-field';
import { useOrganisation } from '../organisation/organisation-context';
import { goAfresh } from '../auth/go-afresh';
import { Button } from '../ui/button';

function NameForm({ organisation }: { organisation: Organisation }) {
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const form = useForm({ resolver: zodResolver(updateOrganisationSchema), mode: 'onTouched', values: { name: organisation.name } });
  const { onSubmit, problem } = useSubmit({
    form,
    send: (typed) => callApi(updateOrganisationContract, { organisation: slug, body: typed, revision: organisation.revision }),
    onDone: () => {
      void queries.invalidateQueries({ queryKey: apiKey(getOrganisationContract) });
      // The name stands in the bar of every page.
      goAfresh(window.location.pathname);
    },
  });
  return (
    <form onSubmit={onSubmit} noValidate className="max-w-80">
      <TextField label="Name" autoComplete="organization" hint={`Addresses keep “${slug}”.`} error={form.formState.errors.name?.message} {...form.register('name')} />
      <ProblemNotice problem={problem} />
      <FormActions answer={form.formState.isSubmitting ? 'Saving.' : null}><Button type="submit">Save name</Button></FormActions>
    </form>
  );
}

export function OrganisationName() {
  const { slug } = useOrganisation();
  const organisation = useApi(getOrganisationContract, { organisation: slug });
  return <Answered query={organisation}>{(data) => <NameForm organisation={data} />}</Answered>;
}
