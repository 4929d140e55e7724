import Link from 'next/link';
import { Fragment, type ReactNode } from 'react';
import { Brand } from './brand';

export interface PlacePart { label: string; href?: string }

interface TopBarProps {
  home?: string;
  /** Where the page is, in words, from the widest to the narrowest; the last part is the page itself. */
  place?: readonly PlacePart[];
  children?: ReactNode;
}

/** Earlier parts give way first, so that the place shortens from the left. */
function Place({ parts }: { parts: readonly PlacePart[] }) {
  return (
    <nav aria-label="Place" className="hidden min-w-0 flex-1 tablet:block">
      <ol className="flex min-w-0 text-table">
        {parts.map((part, index) => {
          const isLast = index === parts.length - 1;
          const shrink = isLast ? 'shrink' : index === parts.length - 2 ? 'shrink-[99]' : 'shrink-[9999]';
          return (
            <Fragment key={`${index} ${part.label}`}>
              <li className={`min-w-0 truncate whitespace-nowrap ${shrink} ${index < parts.length - 2 ? 'hidden wide:block' : ''}`}>
                {part.href && !isLast ? (
                  <Link prefetch={false} href={part.href} className="text-graphite underline-offset-3 hover:underline">{part.label}</Link>
                ) : (
                  <span aria-current={isLast ? 'page' : undefined} className={isLast ? 'font-semibold' : 'text-graphite'}>{part.label}</span>
                )}
                {!isLast && <span className="whitespace-pre text-graphite">, </span>}
              </li>
            </Fragment>
          );
        })}
      </ol>
    </nav>
  );
}

export function TopBar({ home = '/', place = [], children }: TopBarProps) {
  return (
    <header className="top-bar border-b border-hairline">
      <div className="bar-frame flex min-h-12 items-center gap-x-6">
        <Link prefetch={false} href={home} className="bar-brand flex min-h-11 items-center wide:min-h-0">
          <Brand />
        </Link>
        <div className="bar-main flex min-h-12 min-w-0 flex-1 items-center justify-between gap-x-6">
          <Place parts={place} />
          <div className="ml-auto flex shrink-0 items-center gap-x-5 text-table whitespace-nowrap">{children}</div>
        </div>
      </div>
    </header>
  );
}
