'use client';

import { useEffect } from 'react';
import { useFormContext, useWatch } from 'react-hook-form';
import { listCodesContract } from '@/lib/domain/codes/schema';
import { useApi } from '../api/use-api';
import { CheckField } from '../forms/check-field';
import { FaultText } from '../forms/fault-text';
import { TextField } from '../forms/text-field';
import { useOrganisation } from '../organisation/organisation-context';
import type { RoleValues } from './role-values';

const boxes = [
  { role: 'engineer', label: 'engineer', hint: 'Sets up codes, cases and studies, and sends files.' },
  { role: 'reviewer', label: 'reviewer', hint: 'Reads everything, and signs what others made.' },
  { role: 'owner', label: 'owner', hint: 'Looks after members, tokens and the organisation.' },
  { role: 'auditor', label: 'auditor', hint: 'Sees only what is signed, until a day you set. Holds no other role.' },
] as const;

const roleNames = ['auditor', 'engineer', 'reviewer', 'owner'] as const;

function AuditorFields() {
  const { slug } = useOrganisation();
  const { register, formState: { errors } } = useFormContext<RoleValues>();
  const codes = useApi(listCodesContract, { organisation: slug, query: { limit: 200 } });
  return (
    <>
      <TextField label="Access ends after" type="date" error={errors.until?.message} {...register('until')} />
      <fieldset>
        <legend className="mb-1 text-note text-graphite">Sees these codes; none ticked: every code</legend>
        {codes.data?.items.map((code) => <CheckField key={code.id} label={code.name} value={code.slug} {...register('codes')} />)}
        {codes.data?.items.length === 0 && <p className="text-note text-graphite">There are no codes yet.</p>}
        {errors.codes?.message && <FaultText text={errors.codes.message} />}
      </fieldset>
    </>
  );
}

/** What somebody may do; an auditor's end and codes appear once that box is ticked. */
export function RoleFields() {
  const { register, trigger, formState: { errors, isSubmitted } } = useFormContext<RoleValues>();
  const chosen = useWatch<RoleValues, typeof roleNames>({ name: roleNames });
  const [isAuditor] = chosen;
  const together = chosen.join();
  // What is wrong with the roles together changes with each of them, and an end is missing as soon as somebody audits.
  useEffect(() => {
    if (isSubmitted) void trigger(['engineer', 'until']);
  }, [together, isSubmitted, trigger]);
  return (
    <>
      <fieldset>
        <legend className="mb-1 text-note text-graphite">Is</legend>
        {boxes.map(({ role, label, hint }) => <CheckField key={role} label={label} hint={hint} {...register(role)} />)}
        {errors.engineer?.message && <FaultText text={errors.engineer.message} />}
      </fieldset>
      {isAuditor && <div className="grid content-start gap-5"><AuditorFields /></div>}
    </>
  );
}
