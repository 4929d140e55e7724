'use client';

import { useState } from 'react';
import { Button } from './button';

interface CopyButtonProps {
  /** The text, or how to make it at the moment of copying. */
  text: string | (() => string);
  children: string;
}

export function CopyButton({ text, children }: CopyButtonProps) {
  const [answer, setAnswer] = useState('');
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(typeof text === 'string' ? text : text());
      setAnswer('Copied.');
    } catch {
      setAnswer('Not copied. The browser refused; select the text and copy it.');
    }
  };
  return (
    <span className="inline-flex flex-wrap items-center gap-3">
      <Button onClick={copy}>{children}</Button>
      <span role="status" className="text-note text-graphite">{answer}</span>
    </span>
  );
}
