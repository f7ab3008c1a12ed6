import { useState, type ReactNode } from 'react';
import { Logo } from '../../marks/logo.tsx';
import { Segment } from '../../ui/actions/segment.tsx';
import { ToastRegion } from '../../ui/overlays/toast-region.tsx';
import { applyTheme, chosenTheme } from '../../ui/theme.ts';
import { kitWords } from '../../words/kit.ts';
import { signInWords } from '../../words/sign-in.ts';

interface OutsideFrameProps {
  readonly team: string | undefined;
  /** The woven band, on the sign-in page alone. */
  readonly band?: ReactNode;
  readonly children: ReactNode;
}

/** The frame of the screens before sign-in. */
export function OutsideFrame({ team, band, children }: OutsideFrameProps) {
  return (
    <div className="bg-linen flex min-h-screen flex-col">
      <header className="mx-auto flex min-h-18 w-full max-w-[1184px] flex-wrap items-center gap-x-5 px-6 pt-6 max-sm:px-5 max-sm:pt-4">
        <span className="flex items-center gap-2.5">
          <Logo size={30} />
          <span className="text-numeral font-semibold">{kitWords.productName}</span>
        </span>
        <span className="text-sentence text-ink-2">{team}</span>
      </header>
      {band}
      <main className="mx-auto flex w-full max-w-[1184px] grow flex-col px-6 pt-6 pb-10 max-sm:px-5">{children}</main>
      <footer className="mx-auto w-full max-w-[1184px] px-6 pb-6 max-sm:px-5">
        <div className="border-hair text-small text-ink-2 flex flex-wrap items-center justify-between gap-x-6 gap-y-3 border-t pt-4">
          <span>{signInWords.recorded}</span>
          <ThemeChoice />
        </div>
      </footer>
      <ToastRegion />
    </div>
  );
}

function ThemeChoice() {
  const [theme, setTheme] = useState(chosenTheme);
  return (
    <Segment
      label={signInWords.theme}
      value={theme}
      options={[
        { value: 'light', label: signInWords.light },
        { value: 'dark', label: signInWords.dark },
        { value: 'device', label: signInWords.device },
      ]}
      onChange={(next) => {
        applyTheme(next);
        setTheme(next);
      }}
    />
  );
}
