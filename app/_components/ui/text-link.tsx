import Link from 'next/link';
import type { ComponentProps } from 'react';

const look = 'cursor-pointer text-pen underline decoration-pen/40 decoration-1 underline-offset-3 hover:decoration-pen';

// No link is fetched before it is followed: every page is made for its request, and a table holds many links.
export function TextLink({ className = '', ...link }: ComponentProps<typeof Link>) {
  return <Link prefetch={false} {...link} className={`${look} ${className}`} />;
}

/** A name in a table: ink, underlined on hover only. */
export function NameLink({ className = '', ...link }: ComponentProps<typeof Link>) {
  return <Link prefetch={false} {...link} className={`underline-offset-3 hover:underline ${className}`} />;
}

/** An action in running text that leads nowhere else, such as "Numbers" under a figure. */
export function TextButton({ className = '', type = 'button', ...button }: ComponentProps<'button'>) {
  return <button {...button} type={type} className={`${look} ${className}`} />;
}
