import { useEffect, useRef, useState } from 'react';
import { Segment } from '../../ui/actions/segment.tsx';
import { TextField } from '../../ui/fields/text-field.tsx';
import { registryWords } from '../../words/children.ts';

export type RegistryOrder = 'name' | 'birth' | 'late';

interface RegistrySearchProps {
  /** What the page began with; a new `key` begins again. */
  readonly q: string;
  readonly order: RegistryOrder;
  readonly onSearch: (q: string) => void;
  readonly onOrder: (order: RegistryOrder) => void;
}

const orders = (Object.keys(registryWords.orders) as RegistryOrder[]).map((value) => ({
  value,
  label: registryWords.orders[value],
})); // keys of a literal
const restMs = 250;

/** Box and order of the registry. Typing asks after a short rest, not at every letter. */
export function RegistrySearch({ q, order, onSearch, onOrder }: RegistrySearchProps) {
  const [typed, setTyped] = useState(q);
  const timer = useRef<ReturnType<typeof setTimeout> | undefined>(undefined);
  useEffect(() => () => clearTimeout(timer.current), []);
  const ask = () => {
    clearTimeout(timer.current);
    onSearch(typed.trim());
  };
  const type = (text: string) => {
    clearTimeout(timer.current);
    setTyped(text);
    timer.current = setTimeout(() => onSearch(text.trim()), restMs);
  };
  return (
    <form
      role="search"
      onSubmit={(event) => {
        event.preventDefault();
        ask();
      }}
      className="flex flex-wrap items-start justify-between gap-x-6 gap-y-3"
    >
      <div className="w-96 max-w-full">
        <TextField
          label={registryWords.search}
          hint={registryWords.searchHint}
          type="search"
          value={typed}
          onChange={type}
          maxLength={100}
        />
      </div>
      <div className="pt-5.5 max-sm:pt-0">
        <Segment label={registryWords.order} options={orders} value={order} onChange={onOrder} />
      </div>
    </form>
  );
}
