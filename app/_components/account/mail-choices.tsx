'use client';

import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { OptionalMailKind } from '@/lib/domain/mail/preferences';
import { getMailPreferencesContract, updateMailPreferencesContract } from '@/lib/domain/people/account-schema';
import { Answered } from '../api/answered';
import { apiKey } from '../api/api-key';
import { callApi } from '../api/call-api';
import { problemOf } from '../api/problem-of';
import { useApi } from '../api/use-api';
import { CheckField } from '../forms/check-field';
import { ProblemNotice } from '../forms/problem-notice';

const choices: Record<OptionalMailKind, { label: string; hint: string }> = {
  'study-failed': { label: 'A study of mine fails', hint: 'One that you made or sent files to, once it is assessed.' },
};

/** Which mails come; a tick is saved as it is set. */
export function MailChoices() {
  const queries = useQueryClient();
  const preferences = useApi(getMailPreferencesContract, {});
  const choose = useMutation({
    mutationFn: (changes: Partial<Record<OptionalMailKind, boolean>>) => callApi(updateMailPreferencesContract, { body: changes }),
    onSuccess: (saved) => queries.setQueryData(apiKey(getMailPreferencesContract, {}), saved),
  });
  return (
    <Answered query={preferences}>
      {(chosen) => (
        <>
          <fieldset>
            <legend className="mb-1 text-note text-graphite">Mail me when</legend>
            {(Object.keys(choices) as OptionalMailKind[]).map((kind) => (
              <CheckField
                key={kind} {...choices[kind]} disabled={choose.isPending}
                checked={choose.isPending ? (choose.variables[kind] ?? chosen[kind]) : chosen[kind]} onChange={(event) => choose.mutate({ [kind]: event.target.checked })}
              />
            ))}
          </fieldset>
          <span role="status" className="text-note text-graphite">{choose.isPending ? 'Saving.' : choose.isSuccess && 'Saved.'}</span>
          <ProblemNotice problem={problemOf(choose.error, 'Not saved')} />
        </>
      )}
    </Answered>
  );
}
