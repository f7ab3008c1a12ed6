export type ButtonLook = 'filled' | 'plain' | 'quiet' | 'danger';
export type ButtonSize = 'mouse' | 'touch' | 'small';

const looks: Readonly<Record<ButtonLook, string>> = {
  filled:
    'forced-color-adjust-none border-indigo bg-indigo text-on-indigo hover:bg-indigo-deep hover:border-indigo-deep active:bg-indigo-deep px-6',
  plain: 'border-thread-2 bg-transparent text-ink hover:bg-linen hover:border-ink-2 active:bg-sunk px-3.5',
  quiet: 'border-transparent bg-transparent text-indigo underline underline-offset-3 hover:bg-indigo-wash px-2',
  danger: 'border-madder bg-transparent text-madder hover:bg-madder hover:text-on-madder active:bg-madder-deep px-3.5',
};

const sizes: Readonly<Record<ButtonSize, string>> = {
  small: 'min-h-7 text-small',
  mouse: 'min-h-9 text-body',
  touch: 'min-h-11 text-body',
};

const notYetLook = 'border-dashed border-thread-2 bg-transparent text-ink-3 px-3.5 cursor-not-allowed';

/** The look of anything that is pressed like a button, links included. */
export function buttonClass(of: { look: ButtonLook; size: ButtonSize; isNotYet?: boolean }): string {
  const shape =
    'inline-flex shrink-0 items-center justify-center gap-2 rounded border font-semibold whitespace-nowrap transition-colors';
  const look = of.isNotYet === true ? notYetLook : looks[of.look];
  return `${shape} ${sizes[of.size]} ${look}`;
}
