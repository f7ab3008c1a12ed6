interface LogoProps {
  readonly size?: number;
}

/** Three warp threads and a weft that passes over, under and over. */
export function Logo({ size = 26 }: LogoProps) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 26 26"
      fill="none"
      aria-hidden="true"
      focusable="false"
      className="shrink-0"
    >
      <path d="M6.5 2V24M19.5 2V24M13 2V9.5M13 16.5V24" className="stroke-ink" strokeWidth="2.4" />
      <path d="M.5 13H4M9 13H17M22 13H25.5" className="stroke-indigo" strokeWidth="3.6" />
    </svg>
  );
}
