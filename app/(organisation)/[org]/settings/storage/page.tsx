import { HydrationBoundary } from '@tanstack/react-query';
import type { Metadata } from 'next';
import { StorageView } from '@/app/_components/storage/storage-view';
import { answerOf, prefetch } from '@/app/_server/prefetch';
import { requireMember } from '@/app/_server/visit';
import { getStorageContract } from '@/lib/domain/storage/schema';
import { getStorage } from '@/lib/services/storage/get-storage';

export const metadata: Metadata = { title: 'Storage' };

export default async function StoragePage({ params }: { params: Promise<{ org: string }> }) {
  const { org: organisation } = await params;
  const member = await requireMember(organisation);
  return <HydrationBoundary state={await prefetch(answerOf(getStorageContract, { organisation }, getStorage(member)))}><StorageView /></HydrationBoundary>;
}
