export type ButtonKind = 'primary' | 'secondary' | 'binding';

const base = 'inline-flex min-h-11 tablet:min-h-9 cursor-pointer items-center justify-center rounded-field border px-4 text-body leading-5 font-semibold';

const kinds: Record<ButtonKind | 'unavailable', string> = {
  primary: 'border-ink bg-ink text-paper hover:border-graphite hover:bg-graphite',
  secondary: 'border-rule hover:bg-wash',
  binding: 'border-fail text-fail-text hover:bg-wash',
  unavailable: 'cursor-not-allowed border-dashed border-rule text-graphite',
};

export const buttonLook = (kind: ButtonKind | 'unavailable') => `${base} ${kinds[kind]}`;
