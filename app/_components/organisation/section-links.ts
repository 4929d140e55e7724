/** The lists of an organisation: in the bar where there is room, in the account menu always. */
export const sectionLinks = (slug: string) => [
  { label: 'Codes', href: `/${slug}/codes` },
  { label: 'Problems', href: `/${slug}/problems` },
  { label: 'Cases', href: `/${slug}/cases` },
  { label: 'Studies', href: `/${slug}/studies` },
];
