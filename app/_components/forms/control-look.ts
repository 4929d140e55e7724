/** The padding gives way by a pixel under a fault, so that the thicker border moves nothing. */
export const controlLook =
  'block w-full min-w-0 rounded-field border border-rule bg-paper px-3 text-body text-ink ' +
  'aria-invalid:border-2 aria-invalid:border-fail aria-invalid:px-[11px] disabled:border-dashed disabled:text-graphite';

export const lineHeight = 'h-11 tablet:h-9';
