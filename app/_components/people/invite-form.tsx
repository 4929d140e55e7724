'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { FormProvider, useForm } from 'react-hook-form';
import { createInvitationContract, createInvitationSchema, listInvitationsContract } from '@/lib/domain/invitations/schema';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { useSubmit } from '../api/use-submit';
import { checkedResolver, issuesOf } from '../forms/checked-resolver';
import { FormActions } from '../forms/form-actions';
import { ProblemNotice } from '../forms/problem-notice';
import { TextField } from '../forms/text-field';
import { useOrganisation } from '../organisation/organisation-context';
import { Button } from '../ui/button';
import { RoleFields } from './role-fields';
import { engineerOnly, roleFieldOf, roleSetOf, type RoleValues } from './role-values';

interface InviteValues extends RoleValues { email: string }
const empty: InviteValues = { email: '', ...engineerOnly };

function checkInvitation({ email, ...roles }: InviteValues) {
  const parsed = createInvitationSchema.safeParse({ email, ...roleSetOf(roles) });
  return parsed.success ? { ok: true as const, typed: parsed.data } : { ok: false as const, faults: issuesOf(parsed.error) };
}

export function InviteForm() {
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const [invited, setInvited] = useState('');
  const form = useForm({ resolver: checkedResolver(checkInvitation, roleFieldOf), mode: 'onTouched', defaultValues: empty });
  const { errors, isSubmitting } = form.formState;
  const { onSubmit, problem } = useSubmit({
    form, fieldOf: roleFieldOf,
    send: (typed) => callApi(createInvitationContract, { organisation: slug, body: typed }),
    onDone: ({ email }) => {
      setInvited(email);
      form.reset(empty);
      void queries.invalidateQueries({ queryKey: apiKey(listInvitationsContract) });
    },
  });
  return (
    <FormProvider {...form}>
      <form onSubmit={onSubmit} noValidate>
        <div className="grid max-w-[600px] gap-5 tablet:grid-cols-2">
          <TextField label="E-mail" type="email" autoComplete="off" className="tablet:col-span-2 tablet:max-w-[290px]" error={errors.email?.message} {...form.register('email')} />
          <RoleFields />
        </div>
        <ProblemNotice problem={problem} />
        <FormActions answer={isSubmitting ? 'Inviting.' : invited && `A mail to ${invited} is on its way.`}>
          <Button kind="primary" type="submit">Send invitation</Button>
        </FormActions>
      </form>
    </FormProvider>
  );
}
