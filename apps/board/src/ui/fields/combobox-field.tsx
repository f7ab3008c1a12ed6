import type { Ref } from 'react';
import { Button } from 'react-aria-components/Button';
import { ComboBox } from 'react-aria-components/ComboBox';
import { Input } from 'react-aria-components/Input';
import { Label } from 'react-aria-components/Label';
import { ListBox, ListBoxItem } from 'react-aria-components/ListBox';
import { Popover } from 'react-aria-components/Popover';
import { Text } from 'react-aria-components/Text';
import { kitWords } from '../../words/kit.ts';
import { ChevronIcon, SearchIcon } from '../icons.tsx';
import { FieldError } from './field-error.tsx';
import { inputClass, useFieldIds, type FieldProps } from './field-frame.tsx';

export interface ComboboxOption {
  readonly value: string;
  readonly label: string;
  readonly detail?: string | undefined;
}

interface ComboboxFieldProps extends FieldProps<string | null> {
  readonly ref?: Ref<HTMLInputElement>;
  readonly options: readonly ComboboxOption[];
  /** Set: the options are the answer to a search, and this asks for them. Absent: typing filters the options. */
  readonly onSearch?: ((text: string) => void) | undefined;
  readonly isSearching?: boolean | undefined;
  /** A magnifier instead of the arrow, and no list until something is typed. */
  readonly look?: 'field' | 'search';
}

export function ComboboxField(props: ComboboxFieldProps) {
  const { value, onChange, onBlur, name, error, ref, options, onSearch, isSearching, look = 'field' } = props;
  const ids = useFieldIds(props);
  return (
    <ComboBox
      {...(name === undefined ? {} : { name })}
      {...(props.isLabelHidden === true ? { 'aria-label': props.label } : {})}
      {...(onSearch === undefined ? { defaultItems: options } : { items: options, onInputChange: onSearch })}
      {...(onBlur === undefined ? {} : { onBlur: () => onBlur() })}
      value={value}
      onChange={(key) => onChange(key === null ? null : String(key))}
      menuTrigger={look === 'search' ? 'input' : 'focus'}
      allowsEmptyCollection
      isInvalid={Boolean(error)}
      isReadOnly={props.isReadOnly ?? false}
      className="flex min-w-0 flex-col gap-1"
    >
      {props.isLabelHidden === true ? null : (
        <Label className="text-label text-ink">
          {props.label}
          {props.isOptional === true ? <span className="text-ink-3 font-normal"> {kitWords.ifKnown}</span> : null}
        </Label>
      )}
      <div className="relative">
        {look === 'search' ? (
          <span className="text-ink-2 pointer-events-none absolute inset-y-0 left-2.5 flex items-center">
            <SearchIcon size={14} />
          </span>
        ) : null}
        <Input
          id={ids.control}
          {...(ref === undefined ? {} : { ref })}
          {...(look === 'search' ? { placeholder: props.label } : {})}
          className={`${inputClass(Boolean(error))} ${look === 'search' ? 'pl-8' : 'pr-9'}`}
        />
        {look === 'search' ? null : (
          <Button className="text-ink-2 absolute inset-y-0 right-0 flex w-9 items-center justify-center rounded">
            <ChevronIcon size={12} />
          </Button>
        )}
      </div>
      {props.hint ? (
        <Text slot="description" className="text-fine text-ink-3">
          {props.hint}
        </Text>
      ) : null}
      <FieldError id={ids.error} message={error} />
      <Popover className="bg-bleached shadow-lift w-(--trigger-width) min-w-48 rounded">
        <ListBox<ComboboxOption>
          className="max-h-80 overflow-auto py-1"
          renderEmptyState={() => (
            <p className="text-small text-ink-3 m-0 px-3 py-2">
              {isSearching === true ? kitWords.searching : kitWords.nothingFound}
            </p>
          )}
        >
          {(option) => (
            <ListBoxItem
              id={option.value}
              textValue={option.label}
              className="data-focused:bg-indigo-wash text-body text-ink flex min-h-8 cursor-pointer items-center justify-between gap-4 px-3 py-1 data-selected:font-semibold"
            >
              <span>{option.label}</span>
              {option.detail ? <span className="text-fine text-ink-3 font-normal">{option.detail}</span> : null}
            </ListBoxItem>
          )}
        </ListBox>
      </Popover>
    </ComboBox>
  );
}
