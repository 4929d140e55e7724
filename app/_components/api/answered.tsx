'use client';

import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Button } from '../ui/button';
import { Notice } from '../ui/notice';
import { Section } from '../ui/section';
import { ApiProblem } from './api-problem';

interface AnsweredProps<Data> {
  query: UseQueryResult<Data>;
  /** The answer makes sections of its own; what stands in their place needs one too. */
  inSection?: boolean;
  children: (data: Data) => ReactNode;
}

/** What an answer is shown as; while it is missing, that it is being read, or why it cannot be. */
export function Answered<Data>({ query, inSection, children }: AnsweredProps<Data>) {
  if (query.data !== undefined) return children(query.data);
  const instead = query.isError ? <NotRead error={query.error} onRetry={() => void query.refetch()} /> : <p role="status" className="text-graphite">Reading.</p>;
  return inSection ? <Section>{instead}</Section> : instead;
}

function NotRead({ error, onRetry }: { error: Error; onRetry: () => void }) {
  const detail = error instanceof ApiProblem ? error.problem.detail : 'The server did not answer.';
  return <Notice title="Not read." actions={<Button onClick={onRetry}>Read again</Button>}>{detail}</Notice>;
}
