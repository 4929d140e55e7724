import { describe, expect, it } from 'vitest';
import { findWrongLiteral } from '@/tests/support/literals';

describe('a number of a table', () => {
  it('is read bit for bit as the language reads it, over 200 000 random and adversarial literals', () => {
    expect(findWrongLiteral(200_000, 20_261_201)).toMatchObject({ wrong: null });
  });
});
