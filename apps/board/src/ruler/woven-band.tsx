import { rulerWords } from '../words/ruler.ts';
import { positionOfAge } from './scale.ts';

/** The age ruler as cloth, for the sign-in screen only: eleven threads, one of them dyed. Decoration. */
const left = 150;
const width = 1140;
const firstThread = 28;
const threadStep = 20;
const threadCount = 11;
const ownThread = 5;

/** Thread, age in months. An invented path; it says nothing about any child. */
const knots: readonly (readonly [number, number])[] = [
  [0, 0.4],
  [1, 0.6],
  [3, 1],
  [10, 0.5],
  [9, 2],
  [2, 4.4],
  [5, 4.2],
  [8, 5],
  [2, 11],
  [5, 10.4],
  [4, 20],
  [3, 37],
  [7, 38],
  [9, 55],
  [3, 64],
  [10, 68],
  [4, 66],
  [6, 82],
];
const shuttles: readonly (readonly [number, number])[] = [
  [5, 104],
  [6, 106],
];
const loops: readonly (readonly [number, number])[] = [
  [9, 124],
  [10, 124],
  [4, 126],
  [6, 152],
  [4, 168],
  [5, 196],
  [2, 204],
  [7, 210],
  [8, 220],
];
const ages = [0, 6, 18, 72, 144, 252] as const;

const x = (age: number) => left + width * positionOfAge(age);
const y = (thread: number) => firstThread + threadStep * thread;

export function WovenBand() {
  return (
    <svg
      aria-hidden="true"
      viewBox="0 0 1440 290"
      preserveAspectRatio="xMidYMid slice"
      className="block aspect-[1440/290] max-h-80 min-h-44 w-full"
      fill="none"
    >
      {Array.from({ length: Math.floor(width / 13.25) + 1 }, (_, index) => (
        <line
          key={index}
          x1={left + 10 + index * 13.25}
          x2={left + 10 + index * 13.25}
          y1="10"
          y2="244"
          className="stroke-hair"
          strokeWidth="2"
        />
      ))}
      {Array.from({ length: threadCount }, (_, thread) => (
        <Thread key={thread} thread={thread} />
      ))}
      {knots.map(([thread, age]) => (
        <circle key={`${String(thread)} ${String(age)}`} cx={x(age)} cy={y(thread)} r="6.5" className="fill-ink" />
      ))}
      {shuttles.map(([thread, age]) => (
        <path
          key={thread}
          d={`M${String(x(age) - 9)} ${String(y(thread))}q9 -12 18 0q-9 12 -18 0Z`}
          className="fill-indigo"
        />
      ))}
      {loops.map(([thread, age]) => (
        <circle
          key={`${String(thread)} ${String(age)}`}
          cx={x(age)}
          cy={y(thread)}
          r="5"
          className="fill-linen stroke-ink-3"
          strokeWidth="1.75"
        />
      ))}
      {ages.map((age) => (
        <text key={age} x={x(age)} y="266" textAnchor="middle" className="fill-ink-2 text-small max-sm:hidden">
          {rulerWords.bandAge(age)}
        </text>
      ))}
    </svg>
  );
}

/** Loose at both ends, woven over and under in the middle. */
function Thread({ thread }: { readonly thread: number }) {
  const isOwn = thread === ownThread;
  const dye = isOwn ? 'stroke-indigo' : thread % 2 === 0 ? 'stroke-thread-2' : 'stroke-thread';
  const strokeWidth = isOwn ? 4.5 : 3;
  const level = y(thread);
  const spread = level + (thread - ownThread) * 10 + (thread % 3) * 6 - 6;
  const right = left + width;
  return (
    <g className={dye} strokeWidth={strokeWidth}>
      <path d={`M-200 ${String(spread)}H0C60 ${String(spread)} 80 ${String(level)} ${String(left)} ${String(level)}`} />
      <path
        d={`M${String(left)} ${String(level)}H${String(right)}`}
        strokeDasharray="20.5 6"
        strokeDashoffset={thread % 2 === 0 ? 0 : 13.25}
      />
      <path
        d={`M${String(right)} ${String(level)}C${String(right + 70)} ${String(level)} ${String(right + 90)} ${String(spread)} 1440 ${String(spread)}H1640`}
      />
    </g>
  );
}
