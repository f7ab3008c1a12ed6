import { useId } from 'react';

interface SegmentProps<Value extends string> {
  /** What is chosen here; said to assistive technology, not drawn. */
  readonly label: string;
  readonly options: readonly { readonly value: Value; readonly label: string; readonly count?: number | undefined }[];
  readonly value: Value;
  readonly onChange: (value: Value) => void;
  readonly size?: 'mouse' | 'touch';
}

/** One of a few ways of looking, chosen with a press or the arrow keys. */
export function Segment<Value extends string>({
  label,
  options,
  value,
  onChange,
  size = 'mouse',
}: SegmentProps<Value>) {
  const name = useId();
  const height = size === 'touch' ? 'min-h-11' : 'min-h-8';
  return (
    <fieldset className="no-print m-0 inline-flex max-w-full min-w-0 flex-wrap gap-y-1 border-0 p-0">
      <legend className="sr-only">{label}</legend>
      {options.map((option) => (
        <label
          key={option.value}
          className={`border-thread-2 has-checked:bg-ink has-checked:text-paper has-checked:border-ink hover:not-has-checked:bg-linen text-body has-focus-visible:outline-focus relative -ml-px inline-flex forced-color-adjust-none cursor-pointer items-center gap-1.5 border px-3 first-of-type:ml-0 first-of-type:rounded-l last-of-type:rounded-r has-checked:font-semibold has-focus-visible:z-10 has-focus-visible:outline-3 has-focus-visible:outline-offset-2 ${height}`}
        >
          <input
            type="radio"
            name={name}
            className="absolute inset-0 size-full cursor-pointer opacity-0"
            checked={option.value === value}
            onChange={() => onChange(option.value)}
          />
          {option.label}{' '}
          {option.count === undefined ? null : <span className="figures font-semibold">{option.count}</span>}
        </label>
      ))}
    </fieldset>
  );
}
