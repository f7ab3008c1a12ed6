import { rulerWords } from '../../words/ruler.ts';
import { positionOfAge, segmentsOf } from '../scale.ts';
import { axisY, headHeight, type RulerLayout } from '../layout/ruler-layout.ts';
import { notchAges, placedSegmentNames, placedTickLabels, plainTicks, type AxisFrame } from '../layout/ticks.ts';

interface AxisProps {
  readonly layout: RulerLayout;
}

function axisOf({ frame, todayX }: RulerLayout): AxisFrame {
  return { x0: frame.x0, width: frame.axisWidth, period: frame.period, todayX };
}

/** Behind the threads: alternate segments on linen, and a hairline under every labelled tick. */
export function AxisGround({ layout }: AxisProps) {
  const { frame, height } = layout;
  const x = (age: number) => frame.x0 + frame.axisWidth * positionOfAge(age, frame.period);
  return (
    <g aria-hidden="true">
      {segmentsOf(frame.period).map(({ name, from, to }, index) =>
        index % 2 === 1 ? (
          <rect
            key={name}
            x={x(from)}
            width={x(to) - x(from)}
            y={axisY}
            height={height - axisY}
            className="fill-linen"
            opacity="0.55"
          />
        ) : null,
      )}
      {placedTickLabels(axisOf(layout)).map((tick) => (
        <line
          key={tick.x}
          x1={tick.x}
          x2={tick.x}
          y1={headHeight}
          y2={height}
          className="stroke-hair"
          strokeWidth="1"
        />
      ))}
    </g>
  );
}

/** Names of the segments, tick labels, the axis with its ticks, and a notch wherever the scale changes. */
export function AxisHead({ layout }: AxisProps) {
  const { frame } = layout;
  const axis = axisOf(layout);
  const x = (age: number) => frame.x0 + frame.axisWidth * positionOfAge(age, frame.period);
  return (
    <g aria-hidden="true" className="figures text-fine">
      {placedSegmentNames(axis).map((name) => (
        <text key={name.text} x={name.x} y="13" className="fill-ink-2">
          <tspan className="font-semibold">{name.text}</tspan>
          {name.tick === '' ? null : <tspan dx="6">{name.tick}</tspan>}
        </text>
      ))}
      {placedTickLabels(axis).map((tick) => (
        <text
          key={tick.x}
          x={tick.x}
          y="31"
          textAnchor="middle"
          className={tick.text === rulerWords.birth ? 'fill-ink font-semibold' : 'fill-ink-2'}
        >
          {tick.text}
        </text>
      ))}
      <line
        x1={frame.x0}
        x2={frame.x0 + frame.axisWidth}
        y1={axisY}
        y2={axisY}
        className="stroke-thread-2"
        strokeWidth="1"
      />
      {plainTicks(frame.period, frame.axisWidth).map((age) => (
        <line
          key={age}
          x1={x(age)}
          x2={x(age)}
          y1={axisY - 4}
          y2={axisY}
          className="stroke-thread-2"
          strokeWidth="0.8"
        />
      ))}
      {notchAges.map((age) => (
        <path
          key={age}
          d={`M${String(x(age) - 4)} ${String(axisY + 5)}L${String(x(age))} ${String(axisY)}L${String(x(age) + 4)} ${String(axisY + 5)}`}
          fill="none"
          className="stroke-ink-2"
          strokeWidth="1.2"
        />
      ))}
    </g>
  );
}

/** The today line from the head to the foot, under the windows. */
export function TodayLine({ layout }: AxisProps) {
  return (
    <line
      x1={layout.todayX}
      x2={layout.todayX}
      y1="20"
      y2={layout.height}
      className="stroke-ink"
      strokeWidth="1.8"
      aria-hidden="true"
    />
  );
}

/** The flag on the name row, 44 by 18 with a point of 4. */
export function TodayFlag({ x }: { readonly x: number }) {
  return (
    <g aria-hidden="true">
      <path d={`M${String(x - 22)} 2h44v18h-18l-4 4l-4-4h-18Z`} className="fill-ink" />
      <text x={x} y="15" textAnchor="middle" className="fill-paper text-fine font-emphasis">
        {rulerWords.today}
      </text>
    </g>
  );
}
