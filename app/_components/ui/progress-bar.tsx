interface ProgressBarProps {
  label: string;
  /** Done share from 0 to 1; null where it is not known. */
  share: number | null;
}

export function ProgressBar({ label, share }: ProgressBarProps) {
  const percent = share === null ? undefined : Math.round(Math.min(1, Math.max(0, share)) * 100);
  return (
    <svg
      role="progressbar"
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={100}
      aria-valuenow={percent}
      className="block h-1 w-full"
      preserveAspectRatio="none"
    >
      <rect width="100%" height="4" className="fill-hairline" />
      <rect width={`${percent ?? 0}%`} height="4" className="fill-ink transition-[width] duration-120 ease-out" />
    </svg>
  );
}
