import type { ReactNode } from 'react';

/** Pairs of name and value in the margin. */
export function Facts({ facts }: { facts: readonly { name: string; value: ReactNode }[] }) {
  return (
    <dl className="grid grid-cols-[72px_minmax(0,1fr)] gap-x-2 gap-y-[3px] text-note">
      {facts.map(({ name, value }) => (
        <div key={name} className="contents">
          <dt className="text-graphite">{name}</dt>
          <dd className="break-words text-ink">{value}</dd>
        </div>
      ))}
    </dl>
  );
}

export interface LifeStep { name: string; when?: ReactNode; isCurrent?: boolean }

/** The life of a study as ruled lines; the current one is bold behind a bar of ink. */
export function LifeLines({ steps }: { steps: readonly LifeStep[] }) {
  return (
    <ol className="border-t border-hairline text-note">
      {steps.map((step) => (
        <li
          key={step.name}
          aria-current={step.isCurrent ? 'step' : undefined}
          className={`flex justify-between border-b border-hairline py-[3px] pl-[9px] ${
            step.isCurrent ? 'font-semibold text-ink [border-left:3px_solid_var(--ink)]' : '[border-left:3px_solid_transparent]'
          }`}
        >
          <span>{step.name}</span>
          <span>{step.when}</span>
        </li>
      ))}
    </ol>
  );
}
