import { route } from '@/app/_server/route';
import { healthContract } from '@/lib/domain/api/service-schema';

export const GET = route(healthContract, () => Promise.resolve({ alive: true as const }));
