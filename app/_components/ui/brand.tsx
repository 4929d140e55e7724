/** The mark of the product: half the spacing, a quarter of the triangle. */
export function Brand({ name = true }: { name?: boolean }) {
  return (
    <span className="inline-flex items-center gap-[10px]">
      <svg viewBox="0 0 20 20" width="20" height="20" aria-hidden={name} {...(name ? {} : { role: 'img', 'aria-label': 'Fourfold' })}>
        <path d="M1.8 18.25H18.25V1.8z" fill="none" strokeWidth="1.5" className="stroke-ink" />
        <path d="M1.8 18.25H10V10z" className="fill-ink" />
      </svg>
      {name && <span className="font-serif text-[17px] leading-6 font-semibold">Fourfold</span>}
    </span>
  );
}
