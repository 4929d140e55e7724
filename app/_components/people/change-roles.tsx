'use client';

import { useQueryClient } from '@tanstack/react-query';
import { FormProvider, useForm } from 'react-hook-form';
import { listMembersContract, updateMemberContract, updateMemberSchema, type Member } from '@/lib/domain/members/schema';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { useSubmit } from '../api/use-submit';
import { checkedResolver, issuesOf } from '../forms/checked-resolver';
import { FormActions } from '../forms/form-actions';
import { ProblemNotice } from '../forms/problem-notice';
import { useOrganisation } from '../organisation/organisation-context';
import { Button } from '../ui/button';
import { RoleFields } from './role-fields';
import { roleFieldOf, roleSetOf, roleValuesOf, type RoleValues } from './role-values';

function checkRoles(values: RoleValues) {
  const parsed = updateMemberSchema.safeParse(roleSetOf(values));
  return parsed.success ? { ok: true as const, typed: parsed.data } : { ok: false as const, faults: issuesOf(parsed.error) };
}

/** The roles of one member, changed under the table. */
export function ChangeRoles({ member, onClose }: { member: Member; onClose: () => void }) {
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const form = useForm({ resolver: checkedResolver(checkRoles, roleFieldOf), mode: 'onTouched', defaultValues: roleValuesOf(member) });
  const { onSubmit, problem } = useSubmit({
    form, fieldOf: roleFieldOf,
    send: (typed) => callApi(updateMemberContract, { organisation: slug, params: { id: member.id }, body: typed }),
    onDone: () => {
      void queries.invalidateQueries({ queryKey: apiKey(listMembersContract) });
      onClose();
    },
  });
  return (
    <FormProvider {...form}>
      <form onSubmit={onSubmit} noValidate aria-label={`Roles of ${member.email}`} className="mt-4 border-y border-rule py-4">
        <p className="mb-3"><b>Roles of {member.email}.</b> They hold from the moment they are saved, and {member.email.split('@')[0]} is told by mail.</p>
        <div className="grid max-w-[600px] gap-5 tablet:grid-cols-2"><RoleFields /></div>
        <ProblemNotice problem={problem} />
        <FormActions answer={form.formState.isSubmitting ? 'Saving.' : null}>
          <Button kind="primary" type="submit">Save roles</Button>
          <Button onClick={onClose}>Keep as they are</Button>
        </FormActions>
      </form>
    </FormProvider>
  );
}
