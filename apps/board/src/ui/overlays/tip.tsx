import type { ReactElement, ReactNode } from 'react';
import { Focusable } from 'react-aria-components/Focusable';
import { Tooltip, TooltipTrigger } from 'react-aria-components/Tooltip';

interface TipProps {
  /** Text only: a tip never holds controls. */
  readonly text: ReactNode;
  /** One element that can be focused. */
  readonly children: ReactElement<Record<string, unknown>, string>;
}

/** 252 wide, after 350 ms or on focus; Escape hides it. */
export function Tip({ text, children }: TipProps) {
  return (
    <TooltipTrigger delay={350} closeDelay={100}>
      <Focusable>{children}</Focusable>
      <Tooltip offset={6} className="bg-bleached text-ink text-small shadow-lift w-63 rounded px-3 py-2">
        {text}
      </Tooltip>
    </TooltipTrigger>
  );
}
