/** The lists of an organisation: in the bar where there is room, in the account menu always. */
export const sectionLinks = (slug: string) => [
  { label: 'Codes', href: `/${slug}/codes` },
  { label: 'Problems', href: `/${slug}/problems` },
  { label: 'Cases', href: `/${slug}/cases` },
  { label: 'Studies', href: `/${slug}/studies` },
];

/** The settings of an organisation. */
export const settingsLinks = (slug: string) => [
  { label: 'Members', href: `/${slug}/settings/members` },
  { label: 'Tokens', href: `/${slug}/settings/tokens` },
  { label: 'Storage', href: `/${slug}/settings/storage` },
];
