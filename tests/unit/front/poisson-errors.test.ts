import { expect, test } from 'vitest';
import { poissonErrors } from '@/app/_components/front/poisson-errors';

test('poissonErrors(cells) falls fourfold when the spacing is halved', () => {
  const [coarse, middle, fine] = [16, 32, 64].map((cells) => poissonErrors(cells).l2);
  expect(Math.log2((coarse ?? 0) / (middle ?? 1))).toBeCloseTo(2, 1);
  expect(Math.log2((middle ?? 0) / (fine ?? 1))).toBeCloseTo(2, 1);
});
