import type { ReactNode } from 'react';

interface PageProps {
  bar: ReactNode;
  /** State, revision and document in one line; shown above the title where there is no margin. */
  stateLine?: ReactNode;
  children: ReactNode;
}

/** The frame of every page of substance: bar, margin behind a double hairline, rows of sections. */
export function Page({ bar, stateLine, children }: PageProps) {
  return (
    <>
      <a
        href="#content"
        className="absolute left-4 top-[-60px] z-10 bg-paper px-4 py-2 text-pen underline focus:top-1"
      >
        Skip to content
      </a>
      {bar}
      <main id="content" tabIndex={-1} className="page-frame focus-visible:outline-none">
        {stateLine && <p className="mb-2 text-note text-graphite wide:hidden">{stateLine}</p>}
        {children}
      </main>
    </>
  );
}
