import { useId, type ComponentProps, type ReactNode } from 'react';
import { buttonLook, type ButtonKind } from './button-look';

interface ButtonProps extends ComponentProps<'button'> {
  kind?: ButtonKind;
  /** The reason why the action cannot be taken now; it is read beside the button, which stays focusable. */
  unavailable?: ReactNode;
}

export function Button({ kind = 'secondary', unavailable, className = '', type = 'button', onClick, ...button }: ButtonProps) {
  const reasonId = useId();
  if (!unavailable) {
    return <button {...button} type={type} onClick={onClick} className={`${buttonLook(kind)} ${className}`} />;
  }
  return (
    <span className="inline-flex flex-wrap items-center gap-x-3 gap-y-1">
      <button {...button} type="button" aria-disabled aria-describedby={reasonId} className={`${buttonLook('unavailable')} ${className}`} />
      <span id={reasonId} className="text-note text-graphite">{unavailable}</span>
    </span>
  );
}
