import { useQuery } from '@tanstack/react-query';
import { useEffect, useState, type RefObject } from 'react';
import { useNavigate } from 'react-router-dom';
import { formatDate } from '@weftway/calendar/format-date';
import { goToQueries } from '../../queries/go-to-queries.ts';
import { ComboboxField } from '../../ui/fields/combobox-field.tsx';
import { frameWords } from '../../words/frame.ts';

interface ChildFinderProps {
  readonly input: RefObject<HTMLInputElement | null>;
  /** What was typed before this was there. */
  readonly typed: string;
  /** The field that this takes the place of had the focus. */
  readonly hadFocus: boolean;
}

/** Goes on as if what was typed were typed here, so that the list opens for it. */
const goOnTyping = (input: HTMLInputElement, typed: string): void => {
  input.focus();
  if (typed === '') return;
  input.setRangeText(typed, 0, input.value.length, 'end');
  input.dispatchEvent(new Event('input', { bubbles: true }));
};

/** Finds a child by name, record number or birth date. */
export function ChildFinder({ input, typed, hadFocus }: ChildFinderProps) {
  const navigate = useNavigate();
  const [text, setText] = useState('');
  const [visit, setVisit] = useState(0);
  const found = useQuery(goToQueries.children(text));

  const [start] = useState({ typed, hadFocus });
  useEffect(() => {
    if (start.hadFocus && input.current !== null) goOnTyping(input.current, start.typed);
  }, [start, input]);

  const options = (text.trim() === '' ? [] : (found.data?.items ?? [])).map((child) => ({
    value: child.id,
    label: `${child.firstName} ${child.familyName}`,
    detail:
      child.bornOn !== null
        ? frameWords.bornOn(formatDate(child.bornOn))
        : child.dueOn === null
          ? child.recordNumber
          : frameWords.dueOn(formatDate(child.dueOn)),
  }));
  return (
    <ComboboxField
      key={visit}
      ref={input}
      look="search"
      label={frameWords.goToChild}
      isLabelHidden
      value={null}
      options={options}
      onSearch={setText}
      isSearching={found.isFetching}
      onChange={(childId) => {
        if (childId === null) return;
        setText('');
        setVisit(visit + 1);
        void navigate(`/children/${childId}`);
      }}
    />
  );
}
