import { useState } from 'react';
import { newIdempotencyKey, type ProblemDocument } from '../../api/api-client.ts';
import { placeFaults } from '../../api/form-faults.ts';
import { claimKey, itemsOf, type Choices, type OpenClaim } from './hand-over-choices.ts';

export interface HandOverState {
  readonly choices: Choices;
  readonly setChoices: (choices: Choices) => void;
  readonly reason: string;
  readonly setReason: (reason: string) => void;
  readonly reasonFault: string;
  readonly leadFault: string;
  readonly faults: ReadonlyMap<string, string>;
  readonly problem: ProblemDocument | null;
  readonly key: string;
  /** What was chosen, for sending. */
  readonly items: ReturnType<typeof itemsOf>;
  readonly clearFaults: () => void;
  readonly takeError: (error: unknown) => void;
}

/** What is typed and chosen, and where the faults of the server stand. Nothing chosen is lost by a refusal. */
export function useHandOver(claims: readonly OpenClaim[]): HandOverState {
  const [choices, setChoices] = useState<Choices>(new Map());
  const [reason, setReason] = useState('');
  const [reasonFault, setReasonFault] = useState('');
  const [leadFault, setLeadFault] = useState('');
  const [faults, setFaults] = useState<ReadonlyMap<string, string>>(new Map());
  const [problem, setProblem] = useState<ProblemDocument | null>(null);
  const [key] = useState(newIdempotencyKey);
  const items = itemsOf(choices, claims);

  const clearFaults = () => {
    setReasonFault('');
    setLeadFault('');
    setFaults(new Map());
    setProblem(null);
  };
  const takeError = (error: unknown) => {
    const found = new Map<string, string>();
    const setFault = (name: string, message: string) => {
      const item = items[Number(/^items\.(\d+)/.exec(name)?.[1] ?? Number.NaN)];
      if (item !== undefined) found.set(claimKey(item), message);
      else if (name === 'leadTo') setLeadFault(message);
      else setReasonFault(message);
    };
    setProblem(placeFaults(error, { names: ['reason', 'items', 'leadTo'], setFault }));
    setFaults(found);
  };
  return {
    choices,
    setChoices,
    reason,
    setReason,
    reasonFault,
    leadFault,
    faults,
    problem,
    key,
    items,
    clearFaults,
    takeError,
  };
}
