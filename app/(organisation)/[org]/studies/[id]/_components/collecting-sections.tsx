'use client';
import type { Study } from '@/lib/domain/studies/schema';
import type { Reading } from './use-study-events';
export function CollectingSections({ study, readings }: { study: Study; readings: ReadonlyMap<string, Reading> }) {
  return <p>{study.id}{readings.size}</p>;
}
