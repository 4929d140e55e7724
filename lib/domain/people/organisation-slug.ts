import { slugFrom } from '../api/names';

/** First parts of our own addresses: an organisation of that name would hide a page. */
const reservedSlugs: ReadonlySet<string> = new Set([
  'quick-check', 'docs', 'sign-in', 'sign-up', 'sign-out', 'reset-password', 'accept-invitation', 'api', 'codes', 'cases', 'studies', 'problems',
  'schemes', 'reviews', 'evidence', 'settings', 'tokens', 'account', 'organisation', 'about', 'help', 'legal', 'fonts', 'static', 'public',
  'favicon', 'icon', 'robots', 'sitemap', 'new',
]);

/** The slugs to try for an organisation, in their order: its name, then its name with 2, 3 and so on. */
export function organisationSlug(name: string, attempt: number): string {
  const plain = slugFrom(name);
  const number = reservedSlugs.has(plain) ? attempt + 1 : attempt;
  return number === 1 ? plain : `${plain}-${number}`;
}
