import { formatError } from '@/lib/domain/numbers/format-error';
import { Sci } from '../ui/symbols';

/** An error with three digits and a set exponent; zero stays a plain 0. */
export function ErrorText({ value }: { value: number }) {
  const { mantissa, exponent, text } = formatError(value);
  return value === 0 ? <>{text}</> : <Sci mantissa={mantissa} exponent={exponent} />;
}
