import { useEffect, useRef, type ReactNode } from 'react';
import { Button } from 'react-aria-components/Button';
import { Menu as AriaMenu, MenuItem, MenuTrigger } from 'react-aria-components/Menu';
import { Popover } from 'react-aria-components/Popover';
import { ChevronIcon } from '../icons.tsx';
import { buttonClass, type ButtonLook, type ButtonSize } from './button-look.ts';

export interface MenuEntry {
  readonly key: string;
  readonly label: string;
  /** A second line, or the key that does the same. */
  readonly detail?: string | undefined;
  readonly isDanger?: boolean | undefined;
  /** Leads to a screen instead of doing something. */
  readonly href?: string | undefined;
  readonly onAction?: (() => void) | undefined;
}

interface MenuProps {
  /** Accessible name of the menu. */
  readonly label: string;
  readonly entries: readonly MenuEntry[];
  /** What the trigger shows; the label when absent. */
  readonly children?: ReactNode;
  readonly look?: ButtonLook | 'bare';
  readonly size?: ButtonSize;
  /** The press that asked for it came before this was there. */
  readonly opensAtOnce?: boolean;
}

export function Menu({ label, entries, children, look = 'plain', size = 'mouse', opensAtOnce = false }: MenuProps) {
  const trigger = useRef<HTMLButtonElement>(null);
  useEffect(() => {
    if (!opensAtOnce) return;
    // The focus comes back here when the menu closes.
    trigger.current?.focus();
    trigger.current?.click();
  }, [opensAtOnce]);
  const triggerClass = look === 'bare' ? 'rounded text-left' : buttonClass({ look, size });
  return (
    <MenuTrigger>
      <Button ref={trigger} className={triggerClass}>
        {children ?? label}
        {look === 'bare' ? null : <ChevronIcon size={12} />}
      </Button>
      <Popover placement="bottom end" className="bg-bleached shadow-lift min-w-48 rounded">
        <AriaMenu aria-label={label} className="max-h-96 overflow-auto py-1">
          {entries.map((entry) => (
            <MenuItem
              key={entry.key}
              id={entry.key}
              textValue={entry.label}
              {...(entry.href === undefined ? {} : { href: entry.href })}
              {...(entry.onAction === undefined ? {} : { onAction: entry.onAction })}
              className={`data-focused:bg-indigo-wash text-body flex min-h-8 cursor-pointer items-center justify-between gap-4 px-3 py-1 ${entry.isDanger === true ? 'text-madder' : 'text-ink'}`}
            >
              <span>{entry.label}</span>
              {entry.detail === undefined ? null : <span className="text-fine text-ink-3">{entry.detail}</span>}
            </MenuItem>
          ))}
        </AriaMenu>
      </Popover>
    </MenuTrigger>
  );
}
