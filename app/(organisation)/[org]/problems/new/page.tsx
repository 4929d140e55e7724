import type { Metadata } from 'next';
import { ProblemNew } from '@/app/_components/problems/problem-new';

export const metadata: Metadata = { title: 'New problem' };

export default function NewProblemPage() {
  return <ProblemNew />;
}
