import type { ReactNode } from 'react';

interface IconProps {
  readonly size?: number | undefined;
}

function Icon({ size = 16, children }: IconProps & { readonly children: ReactNode }) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 16 16"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.6"
      aria-hidden="true"
      focusable="false"
      className="inline-block shrink-0"
    >
      {children}
    </svg>
  );
}

export const SearchIcon = (props: IconProps) => (
  <Icon {...props}>
    <circle cx="6.75" cy="6.75" r="4.5" />
    <path d="M10.2 10.2 14.25 14.25" />
  </Icon>
);

export const CloseIcon = (props: IconProps) => (
  <Icon {...props}>
    <path d="M3 3 13 13M13 3 3 13" />
  </Icon>
);

export const PrintIcon = (props: IconProps) => (
  <Icon {...props}>
    <path d="M4.5 6V1.75h7V6M4.5 11.5H2V6h12v5.5h-2.5" />
    <path d="M4.5 9.5h7v4.75h-7Z" />
  </Icon>
);

export const MenuIcon = (props: IconProps) => (
  <Icon {...props}>
    <path d="M2 4h12M2 8h12M2 12h12" />
  </Icon>
);

export const ChevronIcon = (props: IconProps) => (
  <Icon {...props}>
    <path d="M3.5 6 8 10.5 12.5 6" />
  </Icon>
);

export const AlertIcon = (props: IconProps) => (
  <Icon {...props}>
    <path d="M8 2.5v7.25M8 12.1v1.9" strokeWidth="2" />
  </Icon>
);

export const TickIcon = (props: IconProps) => (
  <Icon {...props}>
    <path d="M2.75 8.5 6.25 12 13.25 4" strokeWidth="2.1" />
  </Icon>
);

export const UndoIcon = (props: IconProps) => (
  <Icon {...props}>
    <path d="M5.5 2.5 2.5 5.5l3 3" />
    <path d="M2.5 5.5h7a4 4 0 0 1 0 8H6" />
  </Icon>
);
