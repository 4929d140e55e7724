import { describe, expect, it } from 'vitest';
import { rejectionCodes, rejectionReasonSchema } from '@/lib/domain/uploads/rejection';
import { describeRejection } from '@/lib/domain/uploads/rejection-text';

describe('describeRejection(reason)', () => {
  it.each(rejectionCodes)('says of %s what was found and what to do', (code) => {
    const reason = rejectionReasonSchema.parse({ code, count: 3, line: 12, column: 4, found: 'FOUND', expected: 'EXPECTED' });
    const { sentence, nextStep } = describeRejection(reason);
    expect(`${sentence} ${nextStep}`).toMatch(/FOUND/);
    expect(nextStep).toMatch(/\.$/);
    expect(`${sentence} ${nextStep}`).not.toMatch(/undefined|null|!/);
  });

  it('names the place and counts the others', () => {
    expect(describeRejection({ code: 'not-a-number', count: 3, line: 12, column: 4, found: 'failed', expected: 'a finite number' }).sentence)
      .toBe('Line 12, column 4: found “failed”; expected a finite number. 2 more places have the same.');
  });

  it('lists the columns found where one is missing', () => {
    expect(describeRejection({ code: 'column-missing', count: 1, line: 1, column: null, found: 'x, y, u', expected: 'w' }).sentence)
      .toBe('Line 1: the column w is not in the file. Found: x, y, u.');
  });
});
