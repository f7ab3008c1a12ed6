/** One act on one milestone: made once, so that all tries of the same intent carry the same key. */
import { useMutation, useQueryClient, type QueryClient, type UseMutationResult } from '@tanstack/react-query';
import type { Pathway } from '@weftway/contract/pathway';
import { useMemo } from 'react';
import type { Place } from '../../queries/pathway-queries.ts';

interface Act<Input> {
  readonly mutationFn: (input: Input) => Promise<Pathway>;
  readonly onSuccess: (after: Pathway) => void;
}

export const useAct = <Input>(
  make: (client: QueryClient, place: Place) => Act<Input>,
  place: Place,
): UseMutationResult<Pathway, Error, Input> => {
  const client = useQueryClient();
  const { childId, milestone } = place;
  const options = useMemo(() => make(client, { childId, milestone }), [make, client, childId, milestone]);
  return useMutation(options);
};
