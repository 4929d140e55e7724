import type { ComponentProps } from 'react';

type TableInputProps = Omit<ComponentProps<'input'>, 'type'> & {
  /** What the cell holds, since no label stands beside it. */
  label: string;
  isFaulty?: boolean;
  text?: boolean;
};

/** A value typed straight into a table: no box, a hairline at its left, aligned with the column. */
export function TableInput({ label, isFaulty, text, className = '', ...input }: TableInputProps) {
  return (
    <input
      autoComplete="off"
      spellCheck={false}
      inputMode={text ? 'text' : 'decimal'}
      {...input}
      type="text"
      aria-label={label}
      aria-invalid={isFaulty ? true : undefined}
      className={`block h-11 w-full min-w-0 border-l border-hairline bg-transparent px-2 text-body tablet:h-8 ${text ? '' : 'text-right'} rounded-none focus-visible:-outline-offset-2 aria-invalid:text-fail-text aria-invalid:border-2 aria-invalid:border-fail aria-invalid:px-1.5 ${className}`}
    />
  );
}
