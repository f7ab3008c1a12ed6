import { signInWords } from '../../words/sign-in.ts';
import { useMeasuredWidth } from '../../ruler/use-measured-width.ts';
import { ageX, bandBox, bandFoot, bandView, fitsInView, knots, overPath, warpPath, weftPaths } from './band-paths.ts';
import type { Knot, Weft } from './band-paths.ts';

const weftLooks: Readonly<Record<Weft['look'], { readonly className: string; readonly width: number }>> = {
  own: { className: 'stroke-indigo', width: 4.4 },
  strong: { className: 'stroke-thread-2', width: 2.8 },
  faint: { className: 'stroke-thread', width: 2.8 },
};

/** Decoration with the ages written under it: the age ruler as cloth, one thread of eleven in indigo. */
export function WovenBand() {
  const [box, width] = useMeasuredWidth<HTMLDivElement>(bandBox.width);
  const view = bandView(width);
  return (
    <div ref={box} className="h-[330px] overflow-hidden max-sm:h-[200px]">
      <svg
        role="img"
        aria-label={signInWords.bandLabel}
        viewBox={`${String(view.left)} 0 ${String(view.width)} ${String(bandBox.height)}`}
        preserveAspectRatio="xMinYMin meet"
        className="block h-full w-full"
      >
        <path d={warpPath} className="stroke-thread" strokeWidth="1.6" fill="none" />
        {weftPaths.map((weft) => (
          <path
            key={weft.path}
            d={weft.path}
            className={weftLooks[weft.look].className}
            strokeWidth={weftLooks[weft.look].width}
            fill="none"
          />
        ))}
        <path d={overPath} className="stroke-linen" strokeWidth="5" fill="none" />
        <path d={overPath} className="stroke-thread" strokeWidth="1.6" fill="none" />
        {knots.map((knot) => (
          <KnotMark key={`${String(knot.x)} ${String(knot.y)}`} knot={knot} />
        ))}
        {signInWords.bandTicks
          .filter(({ age }) => fitsInView(view, ageX(age)))
          .map(({ age, label }) => (
            <text
              key={label}
              x={ageX(age)}
              y={bandFoot + 24}
              textAnchor={age > 240 ? 'end' : 'middle'}
              className="fill-ink-2"
              fontSize={13 / view.scale}
            >
              {label}
            </text>
          ))}
      </svg>
    </div>
  );
}

function KnotMark({ knot: { x, y, kind } }: { readonly knot: Knot }) {
  if (kind === 'open')
    return <path d={`M${String(x - 8)} ${String(y)}q8 -9 16 0q-8 9 -16 0Z`} className="fill-indigo" />;
  return kind === 'signed' ? (
    <circle cx={x} cy={y} r="7" className="fill-ink" />
  ) : (
    <circle cx={x} cy={y} r="5.2" className="fill-linen stroke-ink-3" strokeWidth="1.7" />
  );
}
