'use client';

import type { Study } from '@/lib/domain/studies/schema';
import { ColumnsSection } from './columns-section';
import { TypedSection } from './typed-section';

/** What a study that collects may need besides files: their columns, and values typed by hand. */
export function CollectingSections({ study, isTyping }: { study: Study; isTyping: boolean }) {
  return (
    <>
      <ColumnsSection study={study} />
      {isTyping && <TypedSection study={study} />}
    </>
  );
}
