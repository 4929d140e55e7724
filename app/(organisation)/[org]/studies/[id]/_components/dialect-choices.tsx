import { SelectField } from '@/app/_components/forms/select-field';
import { refuseDialect, type DecimalMarkName, type Delimiter, type GivenDialect } from '@/lib/domain/columns/given-dialect';
import { delimiterWords } from '@/lib/domain/uploads/dialect-text';
import type { PreviewQuery, UploadPreview } from '@/lib/domain/uploads/schema';

type ShownTable = NonNullable<UploadPreview['table']>;

interface DialectChoicesProps { table: ShownTable; given: GivenDialect; onChange: (given: GivenDialect) => void }

/** The query that shows a table as said, whatever the case says. */
export function dialectQuery({ delimiter, hasHeader, decimalMark }: GivenDialect): PreviewQuery {
  return { delimiter: delimiter ?? 'auto', header: hasHeader === undefined ? 'auto' : hasHeader ? 'yes' : 'no', decimal: decimalMark ?? 'auto' };
}

const headerWords = (table: ShownTable) => (!table.hasHeader ? 'no line of names' : table.headerLine === null ? 'a line of names' : `names in line ${table.headerLine}`);
const found = (isGiven: boolean, words: string) => (isGiven ? 'as found in the file' : `found: ${words}`);

/** How the table is written: what was found out, each of which can be said otherwise. */
export function DialectChoices({ table, given, onChange }: DialectChoicesProps) {
  const say = (change: GivenDialect) => {
    const said = Object.entries({ ...given, ...change }).filter(([, value]) => value !== undefined);
    onChange(Object.fromEntries(said));
  };
  return (
    <fieldset className="mt-6">
      <legend className="mb-2 font-serif text-group font-semibold">How the table is written</legend>
      <div className="grid gap-5 tablet:grid-cols-3">
        <SelectField label="Between columns" value={given.delimiter ?? ''} onChange={({ target }) => say({ delimiter: target.value === '' ? undefined : target.value as Delimiter })}>
          <option value="">{found(given.delimiter !== undefined, delimiterWords[table.delimiter])}</option>
          {Object.entries(delimiterWords).map(([delimiter, words]) => <option key={delimiter} value={delimiter}>{words}</option>)}
        </SelectField>
        <SelectField label="Names of columns" value={given.hasHeader === undefined ? '' : String(given.hasHeader)} onChange={({ target }) => say({ hasHeader: target.value === '' ? undefined : target.value === 'true' })}>
          <option value="">{found(given.hasHeader !== undefined, headerWords(table))}</option>
          <option value="true">the first line names them</option>
          <option value="false">no line of names</option>
        </SelectField>
        <SelectField
          label="Decimal mark" value={given.decimalMark ?? ''} error={refuseDialect(given) ?? undefined}
          onChange={({ target }) => say({ decimalMark: target.value === '' ? undefined : target.value as DecimalMarkName })}
        >
          <option value="">{found(given.decimalMark !== undefined, table.decimalMark ?? 'none in the first rows')}</option>
          <option value="point">point</option>
          <option value="comma">comma</option>
        </SelectField>
      </div>
    </fieldset>
  );
}
