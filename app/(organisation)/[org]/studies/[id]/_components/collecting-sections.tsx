'use client';

import type { Study } from '@/lib/domain/studies/schema';
import { ColumnsSection } from './columns-section';
import { GridsSection } from './grids-section';
import { TypedSection } from './typed-section';
import type { Reading } from './use-study-events';

/** What is done while a study collects: files, their columns, typed values. */
export function CollectingSections({ study, readings }: { study: Study; readings: ReadonlyMap<string, Reading> }) {
  if (study.state !== 'collecting' || study.revision !== study.currentRevision) return null;
  return (
    <>
      <GridsSection study={study} readings={readings} />
      <ColumnsSection study={study} />
      <TypedSection study={study} />
    </>
  );
}
