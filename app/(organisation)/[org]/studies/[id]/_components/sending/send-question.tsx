import { Button } from '@/app/_components/ui/button';
import { DateTime } from '@/app/_components/ui/date-time';
import { formatBytes } from '@/lib/domain/numbers/format-bytes';
import type { Question } from './use-send';

interface SendQuestionProps { question: Question; onReplace: () => void; onDismiss: () => void }

/** Asks before a file takes the place of one that is being sent or half sent. */
export function SendQuestion({ question: { grid, file, why, open }, onReplace, onDismiss }: SendQuestionProps) {
  const stored = open.parts.reduce((sum, { bytes }) => sum + bytes, 0);
  const far = <>{formatBytes(stored)} of {formatBytes(open.bytes)} are stored</>;
  return (
    <span role="group" aria-label={`File for grid ${grid}`} className="block border-b border-t-3 border-b-rule border-t-ink py-3 text-ink">
      {why === 'being-sent'
        ? <><b>Grid {grid} is being sent.</b> {open.createdBy} sends {open.filename} since <DateTime value={open.createdAt} show="time" />; {far}. If you replace it, that stops.</>
        : <><b>{file.name} is another file than the one half sent.</b> Of {open.filename}, {far}; these are lost if you send {file.name === open.filename ? 'the new file' : file.name} instead.</>}
      <span className="mt-3 flex flex-wrap gap-3">
        <Button onClick={onReplace}>{why === 'being-sent' ? 'Replace it' : 'Send it instead'}</Button>
        <Button onClick={onDismiss}>{why === 'being-sent' ? 'Let it go on' : 'Keep the one half sent'}</Button>
      </span>
    </span>
  );
}
