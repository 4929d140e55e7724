import { describe, expect, it } from 'vitest';
import { organisationSlug } from '@/lib/domain/people/organisation-slug';

describe('organisationSlug', () => {
  it('is the name in plain letters, then the same with a number', () => {
    expect([1, 2, 3].map((attempt) => organisationSlug('Northmoor Flow Works', attempt))).toEqual(['northmoor-flow-works', 'northmoor-flow-works-2', 'northmoor-flow-works-3']);
    expect(organisationSlug('Évènement & Søn', 1)).toMatch(/^[a-z0-9-]+$/);
  });
  it('is never the address of a page', () => {
    for (const name of ['Docs', 'Quick check', 'sign-in', 'API', 'Settings', 'accept invitation']) expect(organisationSlug(name, 1)).toMatch(/-2$/);
  });
});
