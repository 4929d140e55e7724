'use client';

import type { CaseForm } from './case-form-type';
import { FaultText } from '../forms/fault-text';
import { SelectField } from '../forms/select-field';
import { TableInput } from '../forms/table-input';
import { TextField } from '../forms/text-field';
import { Cell, HeadCell, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { NormSymbol, Sym } from '../ui/symbols';
import { TextButton } from '../ui/text-link';

const columns = {
  formalOrder: 'Formal order', derivedOrder: 'Derived order', tolerance: 'Tolerance', regularity: 'Regularity', logFactor: 'Log factor', exactLimit: 'Exact below',
} as const;

interface NormRowsProps { form: CaseForm; place: number; isExactness: boolean; onRemove: () => void }

/** What is declared about one field: a row for each norm. */
export function NormRows({ form, place, isExactness, onRemove }: NormRowsProps) {
  const { register, formState: { errors } } = form;
  const field = form.watch(`fields.${place}`);
  const faults = errors.fields?.[place];
  const typed = isExactness ? (['exactLimit'] as const) : (['formalOrder', 'derivedOrder', 'tolerance', 'regularity', 'logFactor'] as const);
  const placeholders = { formalOrder: 'order', derivedOrder: 'none', tolerance: 'rule', regularity: 'smooth', logFactor: 'none', exactLimit: 'round-off' };
  return (
    <fieldset className="flex min-w-0 flex-col gap-3">
      <legend className="sr-only">Field {field.field}</legend>
      <div className="flex flex-wrap items-start gap-x-5 gap-y-2">
        <TextField label="Field" autoComplete="off" spellCheck={false} className="w-32 [&_input]:font-mono" error={faults?.field?.message} {...register(`fields.${place}.field`)} />
        {!isExactness && <TextField label="Where its formal order comes from" autoComplete="off" className="min-w-0 flex-1 basis-60" hint="A citation or the name of the scheme." error={faults?.citation?.message} {...register(`fields.${place}.citation`)} />}
        <TextField label="Compared with" autoComplete="off" spellCheck={false} className="w-48 [&_input]:font-mono" hint="Such as k*d(T, x); empty: the field." error={faults?.compare?.message} {...register(`fields.${place}.compare`)} />
        <SelectField label="Known up to" className="w-40" error={faults?.datum?.message} {...register(`fields.${place}.datum`)}>
          <option value="none">nothing</option><option value="mean">a constant</option><option value="scale">a factor</option><option value="rigid">a rigid motion</option>
        </SelectField>
        <TextButton className="min-h-11 tablet:mt-7 tablet:min-h-9" onClick={onRemove}>Remove field</TextButton>
      </div>
      <Table caption={<>Norms of <Sym>{field.field}</Sym>.</>} hideCaption>
        <Head><tr><HeadCell>Norm</HeadCell>{typed.map((column) => <HeadCell key={column} num>{columns[column]}</HeadCell>)}<HeadCell className="pl-6">Counts</HeadCell></tr></Head>
        <tbody>
          {field.norms.map(({ norm }, at) => {
            const norms = faults?.norms?.[at];
            const messages = [...typed.map((column) => norms?.[column]?.message), norms?.counts?.message].filter((message) => message !== undefined);
            return [
              <Row key={norm}>
                <RowHead className="align-middle"><NormSymbol norm={norm} /></RowHead>
                {typed.map((column) => (
                  <Cell key={column} num className="py-0 pr-0">
                    <TableInput label={`${columns[column]}, ${norm} of ${field.field}`} placeholder={placeholders[column]} isFaulty={norms?.[column] !== undefined} {...register(`fields.${place}.norms.${at}.${column}`)} />
                  </Cell>
                ))}
                <Cell className="pl-6 align-middle">
                  <input type="checkbox" className="size-4 accent-ink" aria-label={`${norm} of ${field.field} counts`} aria-invalid={norms?.counts ? true : undefined} {...register(`fields.${place}.norms.${at}.counts`)} />
                </Cell>
              </Row>,
              messages.length > 0 && <tr key={`${norm} fault`}><td colSpan={typed.length + 2} className="pb-2">{messages.map((message) => <FaultText key={message} text={message} />)}</td></tr>,
            ];
          })}
        </tbody>
      </Table>
    </fieldset>
  );
}
