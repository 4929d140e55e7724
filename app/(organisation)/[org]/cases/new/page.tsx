import type { Metadata } from 'next';
import { CaseNew } from '@/app/_components/cases/case-new';
import { single, type SearchParams } from '@/app/_components/lists/list-query';

export const metadata: Metadata = { title: 'New case' };

export default async function NewCasePage({ searchParams }: { searchParams: SearchParams }) {
  const { code, problem } = await searchParams;
  return <CaseNew chosen={{ code: single(code) ?? '', problem: single(problem) ?? '' }} />;
}
