'use client';

import { useSyncExternalStore } from 'react';

interface DateTimeProps { value: string; show?: 'date' | 'time' | 'both' }

const nothingToWatch = () => () => undefined;
const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];
const two = (n: number) => String(n).padStart(2, '0');

/** A moment in the reader's zone, in UTC on hover. The server writes UTC; the browser then writes its own zone. */
export function DateTime({ value, show = 'date' }: DateTimeProps) {
  const isLocal = useSyncExternalStore(nothingToWatch, () => true, () => false);
  const moment = new Date(value);
  const [year, month, day, hour, minute] = isLocal
    ? [moment.getFullYear(), moment.getMonth(), moment.getDate(), moment.getHours(), moment.getMinutes()]
    : [moment.getUTCFullYear(), moment.getUTCMonth(), moment.getUTCDate(), moment.getUTCHours(), moment.getUTCMinutes()];
  const isThisYear = isLocal && year === new Date().getFullYear();
  const utc = `${moment.getUTCDate()} ${months[moment.getUTCMonth()]} ${moment.getUTCFullYear()}, ${two(moment.getUTCHours())}:${two(moment.getUTCMinutes())} UTC`;
  return (
    <time dateTime={value} title={utc} className="whitespace-nowrap">
      {show !== 'time' && <>{day} {months[month]}<span className={isThisYear ? 'hidden print:inline' : ''}> {year}</span></>}
      {show === 'both' && ', '}
      {show !== 'date' && `${two(hour)}:${two(minute)}`}
    </time>
  );
}
