'use client';

import { zodResolver } from '@hookform/resolvers/zod';
import { useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { useForm } from 'react-hook-form';
import { createCodeContract, createCodeSchema, listCodesContract } from '@/lib/domain/codes/schema';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { useSubmit } from '../api/use-submit';
import { FormActions } from '../forms/form-actions';
import { ProblemNotice } from '../forms/problem-notice';
import { TextField } from '../forms/text-field';
import { useOrganisation } from '../organisation/organisation-context';
import { Button } from '../ui/button';
import { orNothing } from '../forms/or-nothing';

export function CodeForm() {
  const { slug } = useOrganisation();
  const router = useRouter();
  const queries = useQueryClient();
  const form = useForm({ resolver: zodResolver(createCodeSchema), mode: 'onTouched', defaultValues: { name: '', slug: undefined } });
  const { errors, isSubmitting } = form.formState;
  const { onSubmit, problem } = useSubmit({
    form,
    send: (typed) => callApi(createCodeContract, { organisation: slug, body: typed }),
    onDone: (code) => {
      void queries.invalidateQueries({ queryKey: apiKey(listCodesContract) });
      router.push(`/${slug}/codes/${code.slug}`);
    },
  });
  return (
    <form onSubmit={onSubmit} noValidate>
      <div className="grid max-w-[600px] gap-5 tablet:grid-cols-2">
        <TextField label="Name" autoComplete="off" error={errors.name?.message} {...form.register('name')} />
        <TextField label="Short name, if not made from the name" autoComplete="off" spellCheck={false} hint="Stands in addresses." error={errors.slug?.message} {...form.register('slug', orNothing)} />
      </div>
      <ProblemNotice problem={problem} />
      <FormActions answer={isSubmitting ? 'Making the code.' : null}><Button kind="primary" type="submit">Make the code</Button></FormActions>
    </form>
  );
}
