'use client';

import type { NewToken } from '@/lib/domain/tokens/schema';
import { Button } from '../ui/button';
import { CopyButton } from '../ui/copy-button';

/** The secret of a token just made: it is shown this once. */
export function NewSecret({ token, onClose }: { token: NewToken; onClose: () => void }) {
  return (
    <div role="status" className="mb-8 border-y-[1.5px] border-ink py-4">
      <p><b>The secret of {token.name}.</b> Copy it now; it is not shown again.</p>
      <code className="my-3 block bg-wash px-3 py-2 font-mono text-code break-all select-all">{token.token}</code>
      <div className="flex flex-wrap gap-3"><CopyButton text={token.token}>Copy secret</CopyButton><Button onClick={onClose}>Done</Button></div>
    </div>
  );
}
