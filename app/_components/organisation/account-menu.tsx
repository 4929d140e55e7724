'use client';

import Link from 'next/link';
import { DropdownMenu } from 'radix-ui';
import { useState } from 'react';
import { signOutContract } from '@/lib/domain/people/schema';
import { callApi } from '../api/call-api';
import { goAfresh } from '../auth/go-afresh';
import { useOrganisation } from './organisation-context';
import { sectionLinks, settingsLinks } from './section-links';

const item = 'flex min-h-11 cursor-pointer items-center px-4 outline-none data-[highlighted]:bg-wash tablet:min-h-9';
const rule = 'my-1 border-t border-hairline';

/** Yourself: sections where the bar has no room for them, other organisations, settings, your account, the way out. */
export function AccountMenu() {
  const { email, slug, name, roles, organisations } = useOrganisation();
  const [fault, setFault] = useState(false);
  const signOut = async () => {
    try {
      await callApi(signOutContract, {});
      goAfresh('/');
    } catch {
      setFault(true);
    }
  };
  return (
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger className="flex min-h-11 max-w-48 cursor-pointer items-center gap-2 wide:min-h-9" aria-label={`Account ${email}`}>
        <span className="truncate">{email.split('@')[0]}</span>
        <svg viewBox="0 0 10 6" width="10" height="6" aria-hidden className="shrink-0 stroke-rule" fill="none"><path d="M1 1l4 4 4-4" /></svg>
      </DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content align="end" sideOffset={4} collisionPadding={8} className="z-10 min-w-60 max-w-[calc(100vw-16px)] border border-rule bg-paper py-1 text-table">
          <DropdownMenu.Label className="px-4 py-2 text-note text-graphite">
            <b className="block break-words text-ink">{email}</b>
            {roles.join(', ')} in {name}
          </DropdownMenu.Label>
          <div className="wide:hidden">
            <DropdownMenu.Separator className={rule} />
            {sectionLinks(slug).map(({ label, href }) => (
              <DropdownMenu.Item key={href} asChild><Link prefetch={false} href={href} className={item}>{label}</Link></DropdownMenu.Item>
            ))}
          </div>
          {organisations.length > 1 && (
            <DropdownMenu.Group>
              <DropdownMenu.Separator className={rule} />
              <DropdownMenu.Label className="px-4 pt-1 text-note text-graphite">Organisation</DropdownMenu.Label>
              {organisations.map((other) => (
                <DropdownMenu.Item key={other.id} asChild>
                  <Link prefetch={false} href={`/${other.slug}`} aria-current={other.slug === slug || undefined} className={`${item} ${other.slug === slug ? 'font-semibold' : ''}`}>{other.name}</Link>
                </DropdownMenu.Item>
              ))}
            </DropdownMenu.Group>
          )}
          <DropdownMenu.Separator className={rule} />
          {settingsLinks(slug).map(({ label, href }) => (
            <DropdownMenu.Item key={href} asChild><Link prefetch={false} href={href} className={item}>{label}</Link></DropdownMenu.Item>
          ))}
          <DropdownMenu.Separator className={rule} />
          <DropdownMenu.Item asChild><Link prefetch={false} href="/account" className={item}>Account and mail</Link></DropdownMenu.Item>
          <DropdownMenu.Item asChild><Link prefetch={false} href="/docs/methods" className={item}>Methods and sources</Link></DropdownMenu.Item>
          <DropdownMenu.Item className={item} onSelect={(event) => { event.preventDefault(); void signOut(); }}>Sign out</DropdownMenu.Item>
          {fault && <p role="alert" className="px-4 py-2 text-note text-fail-text">Not signed out. The server did not answer; try again.</p>}
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}
