import Link from 'next/link';
import type { ComponentProps } from 'react';
import { buttonLook, type ButtonKind } from './button-look';

export function ButtonLink({ kind = 'secondary', className = '', ...link }: ComponentProps<typeof Link> & { kind?: ButtonKind }) {
  return <Link prefetch={false} {...link} className={`${buttonLook(kind)} no-underline ${className}`} />;
}
