import type { ReactNode } from 'react';
import { Notice } from '../ui/notice';

/** An answer of the API that refused something, as RFC 9457 shapes it. */
interface ProblemAnswer {
  title: string;
  detail?: string;
  errors?: readonly { path: string; message: string }[];
}

interface ProblemNoticeProps {
  problem: ProblemAnswer | null;
  /** Paths whose fault already stands at its own field. */
  shownAtField?: readonly string[];
  actions?: ReactNode;
}

export function ProblemNotice({ problem, shownAtField = [], actions }: ProblemNoticeProps) {
  if (!problem) return null;
  const faults = (problem.errors ?? []).filter(({ path }) => !shownAtField.includes(path));
  const title = /[.?]$/.test(problem.title) ? problem.title : `${problem.title}.`;
  return (
    <div className="mt-4">
      <Notice title={title} actions={actions}>
        {problem.detail}
        {faults.map(({ path, message }) => (
          <span key={`${path} ${message}`} className="block">
            {path && <code className="font-mono text-code">{path}</code>} {message}
          </span>
        ))}
      </Notice>
    </div>
  );
}
