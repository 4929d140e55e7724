import type { Database } from '@/db/client';
import type { Role } from '@/lib/domain/people/roles';
import type { TokenScope } from '@/lib/domain/tokens/scopes';
import type { Logger } from '@/lib/platform/logger';
import type { RateLimits } from '@/lib/platform/rate-limits';
import type { Storage } from '@/lib/platform/storage';
import type { StudyEvents } from '@/lib/platform/study-events';
import type { Trx } from './with-organisation';

/** What every service is handed; tests hand in a fixed clock. */
export interface Context {
  db: Database;
  storage: Storage;
  /** What an organisation may store where no quota of its own is set. */
  storageQuotaBytes: number;
  events: StudyEvents;
  limits: RateLimits;
  /** Whether a worker was there within half a minute; null where the queue cannot be asked. */
  isWorkerSeen: () => Promise<boolean | null>;
  clock: () => Date;
  log: Logger;
  /** Of the request that is answered, or that caused the job. */
  requestId?: string | null;
  /** The transaction that everything of this call is part of, where there is one. */
  within?: Trx;
}

export interface TokenActor { id: string; name: string; scopes: TokenScope[]; codeId: string | null }

/** Somebody signed in, by session or by a token of theirs. */
export interface UserContext extends Context {
  userId: string;
  email: string;
  token: TokenActor | null;
}

/** Somebody acting in one organisation. */
export interface MemberContext extends UserContext {
  organisation: { id: string; slug: string; name: string };
  roles: Role[];
}
