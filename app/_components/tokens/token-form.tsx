'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { listCodesContract } from '@/lib/domain/codes/schema';
import { createTokenContract, createTokenSchema, listTokensContract, type NewToken } from '@/lib/domain/tokens/schema';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { useApi } from '../api/use-api';
import { useSubmit } from '../api/use-submit';
import { CheckField } from '../forms/check-field';
import { checkedResolver, issuesOf } from '../forms/checked-resolver';
import { FaultText } from '../forms/fault-text';
import { FormActions } from '../forms/form-actions';
import { ProblemNotice } from '../forms/problem-notice';
import { SelectField } from '../forms/select-field';
import { TextField } from '../forms/text-field';
import { useOrganisation } from '../organisation/organisation-context';
import { Button } from '../ui/button';
import { NewSecret } from './new-secret';

interface TokenValues { name: string; code: string; read: boolean; write: boolean; expiresAt: string }
const empty: TokenValues = { name: '', code: '', read: true, write: false, expiresAt: '' };

function checkToken({ name, code, read, write, expiresAt }: TokenValues) {
  const parsed = createTokenSchema.safeParse({
    name, code: code === '' ? undefined : code, scopes: [...(read ? ['read'] : []), ...(write ? ['write'] : [])],
    // The token ends with the day that was chosen, where the person is.
    expiresAt: expiresAt === '' ? undefined : new Date(`${expiresAt}T23:59:59`).toISOString(),
  });
  return parsed.success ? { ok: true as const, typed: parsed.data } : { ok: false as const, faults: issuesOf(parsed.error) };
}

const fieldOf = (path: string) => (path.startsWith('scopes') ? 'read' : path);

export function TokenForm() {
  const { slug } = useOrganisation();
  const queries = useQueryClient();
  const codes = useApi(listCodesContract, { organisation: slug, query: { limit: 200 } });
  const [made, setMade] = useState<NewToken | null>(null);
  const form = useForm({ resolver: checkedResolver(checkToken, fieldOf), mode: 'onTouched', defaultValues: empty });
  const { errors, isSubmitting } = form.formState;
  const { onSubmit, problem } = useSubmit({
    form, fieldOf,
    send: (typed) => callApi(createTokenContract, { organisation: slug, body: typed }),
    onDone: (token) => {
      setMade(token);
      form.reset(empty);
      void queries.invalidateQueries({ queryKey: apiKey(listTokensContract) });
    },
  });
  return (
    <>
      {made && <NewSecret token={made} onClose={() => setMade(null)} />}
      <form onSubmit={onSubmit} noValidate>
        <div className="grid max-w-[600px] gap-5 tablet:grid-cols-2">
          <TextField label="Name" autoComplete="off" hint="What uses it, such as nightly run." error={errors.name?.message} {...form.register('name')} />
          <SelectField label="Reaches" error={errors.code?.message} {...form.register('code')}>
            <option value="">every code</option>
            {codes.data?.items.map((code) => <option key={code.id} value={code.slug}>only {code.name}</option>)}
          </SelectField>
          <fieldset>
            <legend className="mb-1 text-note text-graphite">May</legend>
            <CheckField label="read" {...form.register('read')} />
            <CheckField label="write: create studies, send files" {...form.register('write', { deps: ['read'] })} />
            {errors.read?.message && <FaultText text="None chosen. A token that may do nothing is of no use." />}
          </fieldset>
          <TextField label="Ends after, if ever" type="date" error={errors.expiresAt?.message} {...form.register('expiresAt')} />
        </div>
        <ProblemNotice problem={problem} />
        <FormActions answer={isSubmitting ? 'Making the token.' : null}><Button kind="primary" type="submit">Make the token</Button></FormActions>
      </form>
    </>
  );
}
