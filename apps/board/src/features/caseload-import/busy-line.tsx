import { useEffect, useState } from 'react';
import { importWords } from '../../words/import.ts';

interface BusyLineProps {
  /** What is going on. */
  readonly phase: string;
  readonly note?: string | undefined;
}

/** Says what is being done and for how long; the seconds are not read aloud. */
export function BusyLine({ phase, note }: BusyLineProps) {
  const [seconds, setSeconds] = useState(0);
  useEffect(() => {
    const timer = setInterval(() => setSeconds((past) => past + 1), 1000);
    return () => clearInterval(timer);
  }, []);
  return (
    <div className="border-indigo flex flex-col gap-0.5 border-l-5 py-0.5 pl-4">
      <p className="text-head m-0">
        <span role="status">{phase} …</span>{' '}
        <span className="text-body text-ink-2 figures">{importWords.elapsed(seconds)}</span>
      </p>
      {note === undefined ? null : <p className="text-body text-ink-2 m-0">{note}</p>}
    </div>
  );
}
