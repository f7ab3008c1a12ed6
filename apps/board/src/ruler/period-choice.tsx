import { Segment } from '../ui/actions/segment.tsx';
import { rulerWords } from '../words/ruler.ts';
import { periods, type Period } from './scale.ts';

interface PeriodChoiceProps {
  readonly value: Period;
  readonly onChange: (period: Period) => void;
}

/** The whole life, or one part of it looked at closer. */
export function PeriodChoice({ value, onChange }: PeriodChoiceProps) {
  const options = periods.map((period) => ({ value: period, label: rulerWords.periods[period] }));
  return <Segment label={rulerWords.period} options={options} value={value} onChange={onChange} />;
}
