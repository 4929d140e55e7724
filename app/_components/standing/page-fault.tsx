'use client';

import { useEffect, useState } from 'react';
import { readyContract } from '@/lib/domain/api/service-schema';
import { callApi } from '../api/call-api';
import { Button } from '../ui/button';
import { ButtonLink } from '../ui/button-link';
import { Notice } from '../ui/notice';
import { missingOf, missingWords, type Missing } from './services-words';

interface PageFaultProps { error: Error & { digest?: string }; home: string; homeName: string }

const askAgainMilliseconds = 4000;

/** A part of the program that is no longer there: the page was opened before the product was updated. */
const isOfBefore = (error: Error) => error.name === 'ChunkLoadError' || /loading chunk|load chunk|dynamically imported module/i.test(error.message);

/** What does not answer, asked until everything does; null until it is known. */
function useMissing(): readonly Missing[] | null {
  const [missing, setMissing] = useState<readonly Missing[] | null>(null);
  useEffect(() => {
    const ask = () => void callApi(readyContract, {}).then(() => [], missingOf).then(setMissing);
    ask();
    const timer = setInterval(ask, askAgainMilliseconds);
    return () => clearInterval(timer);
  }, []);
  return missing;
}

/** In place of a page that could not be made, which has no title of its own: why, as far as that can be told, and the ways on. */
export function PageFault(fault: PageFaultProps) {
  return <><title>Not shown · Fourfold</title><Reason {...fault} /></>;
}

function Reason({ error, home, homeName }: PageFaultProps) {
  const missing = useMissing();
  const again = <Button kind="primary" onClick={() => window.location.reload()}>Load the page again</Button>;
  if (isOfBefore(error)) {
    return <Notice title="Fourfold was updated." actions={again}>This page was opened before, and parts of it are no longer there. What was saved is safe.</Notice>;
  }
  const actions = <>{again}<ButtonLink href={home}>{homeName}</ButtonLink><ButtonLink href="/quick-check">Check a series</ButtonLink></>;
  const [first] = missing ?? [];
  if (first !== undefined) {
    const names = missing?.includes('database') ? ['database' as const] : (missing ?? []);
    return (
      <Notice title={missingWords[names[0] ?? first].title} actions={actions}>
        {missingWords[names[0] ?? first].text} What was saved before is safe. The check of a series works: it stays in your browser.
      </Notice>
    );
  }
  return (
    <Notice title="Not shown." actions={actions}>
      Something went wrong on our side; what was saved before is safe.
      {missing && ' Database, queue and storage answer now, so it may do to load the page again.'}
      {error.digest && <> If it happens again, quote <code className="font-mono text-code">{error.digest}</code>.</>}
    </Notice>
  );
}
