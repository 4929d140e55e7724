import { route } from '@/app/_server/route';
import { getStorageContract } from '@/lib/domain/storage/schema';
import { getStorage } from '@/lib/services/storage/get-storage';

export const GET = route(getStorageContract, ({ ctx }) => getStorage(ctx));
