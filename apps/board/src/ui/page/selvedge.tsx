interface SelvedgeProps {
  readonly direction?: 'across' | 'down';
}

/** The bound edge of the cloth: under the top bar, down the side sheet, under the print head. Nowhere else. */
export function Selvedge({ direction = 'across' }: SelvedgeProps) {
  return <div aria-hidden="true" className={direction === 'across' ? 'selvedge' : 'selvedge-down shrink-0'} />;
}
