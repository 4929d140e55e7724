import type { Metadata } from 'next';
import { PublicPage } from '@/app/_components/public/public-page';
import { QuickCheckView } from '@/app/_components/quick-check/quick-check-view';
import { findHome } from '@/app/_server/visit';

export const metadata: Metadata = { title: 'Quick check' };

export default async function QuickCheckPage() {
  return <PublicPage title="Quick check" home={await findHome()}><QuickCheckView /></PublicPage>;
}
