const cookieName = 'fourfold_organisation';
const yearSeconds = 365 * 24 * 3600;

/** The organisation somebody worked in last, from the cookies of a request or of the page; only a hint where to go on. */
function lastOrganisation(cookies: string): string | null {
  return new RegExp(`(?:^|; ?)${cookieName}=([a-z0-9-]+)`).exec(cookies)?.[1] ?? null;
}

export function rememberOrganisation(slug: string): void {
  document.cookie = `${cookieName}=${slug}; path=/; max-age=${yearSeconds}; samesite=lax`;
}

/** The one to go on in: the last one worked in where it is still there, else the first, else none. */
export function organisationToOpen<Organisation extends { slug: string }>(organisations: readonly Organisation[], cookies: string): Organisation | undefined {
  const last = lastOrganisation(cookies);
  return organisations.find(({ slug }) => slug === last) ?? organisations[0];
}
