import { listRecordFaults, type RecordFault } from '@/db/queries/records';
import { checkBucket } from './check-bucket';
import { checkFiles, type FileCheck } from './check-files';

const dayMilliseconds = 24 * 3600 * 1000;

export interface RecordCheck extends FileCheck { clock: () => Date }

/** How much was looked at and found. */
export interface RecordCounts { files: number; faults: number; onTheirWay: number }

/**
 * Whether what must hold holds, whatever died before: every whole file lies in storage, nothing lies there that no row
 * explains, no study is stuck, no result is missing or doubled. What lies unexplained for less than a day may be on its way
 * and is only counted.
 */
export async function checkRecords(check: RecordCheck, onFault: (fault: RecordFault) => void): Promise<RecordCounts> {
  const counts: RecordCounts = { files: 0, faults: 0, onTheirWay: 0 };
  const tell = (fault: RecordFault) => {
    counts.faults += 1;
    onFault(fault);
  };
  for (const fault of await listRecordFaults(check.db, check.organisationId)) tell(fault);
  for await (const fault of checkFiles(check, () => { counts.files += 1; })) tell(fault);
  const dayAgo = check.clock().getTime() - dayMilliseconds;
  for await (const { since, ...fault } of checkBucket(check)) {
    if (since.getTime() > dayAgo) counts.onTheirWay += 1;
    else tell(fault);
  }
  return counts;
}
