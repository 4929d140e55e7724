'use client';

import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Button } from '../ui/button';
import { Notice } from '../ui/notice';
import { ApiProblem } from './api-problem';

interface AnsweredProps<Data> { query: UseQueryResult<Data>; children: (data: Data) => ReactNode }

/** What an answer is shown as; while it is missing, that it is being read, or why it cannot be. */
export function Answered<Data>({ query, children }: AnsweredProps<Data>) {
  if (query.data !== undefined) return children(query.data);
  if (!query.isError) return <p role="status" className="text-graphite">Reading.</p>;
  const detail = query.error instanceof ApiProblem ? query.error.problem.detail : 'The server did not answer.';
  return <Notice title="Not read." actions={<Button onClick={() => void query.refetch()}>Read again</Button>}>{detail}</Notice>;
}
