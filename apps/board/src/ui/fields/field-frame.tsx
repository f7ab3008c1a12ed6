import { useId, type ReactNode } from 'react';
import { kitWords } from '../../words/kit.ts';
import { FieldError } from './field-error.tsx';

/** What every field of a form takes; spreads straight from a form library's controller. */
export interface FieldProps<Value> {
  readonly label: string;
  readonly value: Value;
  readonly onChange: (value: Value) => void;
  readonly onBlur?: (() => void) | undefined;
  readonly name?: string | undefined;
  readonly id?: string | undefined;
  readonly hint?: ReactNode;
  readonly error?: string | undefined;
  /** Writes "(if known)" after the label. */
  readonly isOptional?: boolean | undefined;
  readonly isLabelHidden?: boolean | undefined;
  readonly isReadOnly?: boolean | undefined;
}

/** The address of a field, so that a summary of errors can lead to it. */
export function fieldId(name: string): string {
  return `field-${name.replace(/[^\w-]/g, '-')}`;
}

export interface FieldIds {
  readonly control: string;
  readonly hint: string;
  readonly error: string;
  readonly describedBy: string | undefined;
}

export function useFieldIds(field: Pick<FieldProps<never>, 'id' | 'name' | 'hint' | 'error'>): FieldIds {
  const made = useId();
  const control = field.id ?? (field.name === undefined ? made : fieldId(field.name));
  const hint = `${made}-hint`;
  const error = `${made}-error`;
  const told = [field.error ? error : null, field.hint ? hint : null].filter((id) => id !== null);
  return { control, hint, error, describedBy: told.length === 0 ? undefined : told.join(' ') };
}

interface FieldFrameProps {
  readonly ids: FieldIds;
  readonly field: Pick<FieldProps<never>, 'label' | 'hint' | 'error' | 'isOptional' | 'isLabelHidden'>;
  readonly children: ReactNode;
}

/** Label above, hint and error below. */
export function FieldFrame({ ids, field, children }: FieldFrameProps) {
  return (
    <div className="flex min-w-0 flex-col gap-1">
      <label htmlFor={ids.control} className={field.isLabelHidden === true ? 'sr-only' : 'text-label text-ink'}>
        {field.label}
        {field.isOptional === true ? <span className="text-ink-3 font-normal"> {kitWords.ifKnown}</span> : null}
      </label>
      {children}
      {field.hint ? (
        <div id={ids.hint} className="text-fine text-ink-3">
          {field.hint}
        </div>
      ) : null}
      <FieldError id={ids.error} message={field.error} />
    </div>
  );
}

/** The box of anything that is typed into. */
export function inputClass(hasError: boolean): string {
  const edge = hasError ? 'border-2 border-madder px-[9px]' : 'border border-thread-2 px-2.5';
  return `bg-bleached text-ink text-body min-h-9 w-full min-w-0 rounded py-1.5 [&[readonly]]:bg-transparent max-sm:min-h-11 ${edge}`;
}
