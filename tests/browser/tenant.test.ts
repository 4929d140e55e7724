import { expect } from 'vitest';
import { browserTest } from '@/tests/support/browser';
import { signUp } from '@/tests/support/people';
import { makeShownWork } from '@/tests/support/shown-work';

browserTest('a colleague of another organisation finds nothing, under either organisation’s address', async ({ open }) => {
  const { person, study, code } = await makeShownWork();
  const stranger = await signUp('Elsewhere Works');
  for (const address of [`/${person.at.slug}/studies/${study}`, `/${stranger.at.slug}/studies/${study}`, `/${person.at.slug}/studies`, `/${person.at.slug}/codes/${code.slug}`]) {
    const page = await open(address, { person: stranger });
    await page.getByRole('heading', { level: 1, name: /not found|not here|nothing/i }).waitFor();
    expect(await page.getByText('Heat, second order').count()).toBe(0);
  }
});
