import type { Matrix } from '@/lib/domain/matrix/schema';

const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

interface ReleaseHeadProps { release: Matrix['releases'][number]; isNewest: boolean }

/** A release over its column; the newest under a heavy rule. */
export function ReleaseHead({ release, isNewest }: ReleaseHeadProps) {
  const made = new Date(release.createdAt);
  return (
    <th scope="col" className={`min-w-[62px] px-1 pt-1.5 pb-1.5 text-center align-bottom font-normal ${isNewest ? 'border-t-3' : 'border-t-[1.5px]'} border-ink`}>
      <b className="block text-ink">{release.version}</b>
      <span className="block whitespace-nowrap">{release.state === 'current' ? `${months[made.getUTCMonth()]} ${String(made.getUTCFullYear()).slice(2)}` : release.state}</span>
    </th>
  );
}
