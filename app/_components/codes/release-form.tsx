'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useQueryClient } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import { createReleaseContract, createReleaseSchema, listReleasesContract } from '@/lib/domain/codes/schema';
import { getMatrixContract } from '@/lib/domain/matrix/schema';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { useSubmit } from '../api/use-submit';
import { FormActions } from '../forms/form-actions';
import { orNothing } from '../forms/or-nothing';
import { ProblemNotice } from '../forms/problem-notice';
import { TextField } from '../forms/text-field';
import { useOrganisation } from '../organisation/organisation-context';
import { Button } from '../ui/button';

export function ReleaseForm({ code }: { code: string }) {
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const form = useForm({ resolver: zodResolver(createReleaseSchema), mode: 'onTouched', defaultValues: { version: '', commit: undefined } });
  const { errors, isSubmitting, isSubmitSuccessful } = form.formState;
  const { onSubmit, problem } = useSubmit({
    form,
    send: (typed) => callApi(createReleaseContract, { organisation: slug, params: { code }, body: typed }),
    onDone: () => {
      form.reset({ version: '', commit: '' }, { keepIsSubmitSuccessful: true });
      void queries.invalidateQueries({ queryKey: apiKey(listReleasesContract) });
      void queries.invalidateQueries({ queryKey: apiKey(getMatrixContract) });
    },
  });
  const answer = isSubmitting ? 'Making the release.' : isSubmitSuccessful && !problem ? 'Made.' : null;
  return (
    <form onSubmit={onSubmit} noValidate aria-label="Make a release">
      <div className="grid max-w-[600px] gap-5 tablet:grid-cols-2">
        <TextField label="Version" autoComplete="off" spellCheck={false} hint="Such as 2.4.0." error={errors.version?.message} {...form.register('version')} />
        <TextField label="Commit, if any" autoComplete="off" spellCheck={false} error={errors.commit?.message} {...form.register('commit', orNothing)} />
      </div>
      <ProblemNotice problem={problem} />
      <FormActions answer={answer}><Button type="submit">Make the release</Button></FormActions>
    </form>
  );
}
