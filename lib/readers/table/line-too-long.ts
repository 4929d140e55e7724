import type { RejectionReason } from '../../domain/uploads/rejection';
import { longestLine } from '../read-head';

export const lineTooLong = (line: number): RejectionReason => ({
  code: 'line-too-long', count: 1, line, column: null, found: `more than ${longestLine} bytes in one line`, expected: 'lines of at most 1 MiB',
});
