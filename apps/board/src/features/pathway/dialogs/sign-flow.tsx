import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { Evidence } from '@weftway/contract/pathway';
import { useEffect, useEffectEvent, useMemo } from 'react';
import { isProblem } from '../../../api/api-client.ts';
import { pathwayMutations, pathwayQueries, type Place } from '../../../queries/pathway-queries.ts';
import type { ComboboxOption } from '../../../ui/fields/combobox-field.tsx';
import { Dialog } from '../../../ui/overlays/dialog.tsx';
import { Loading } from '../../../ui/notices/loading.tsx';
import { showToast } from '../../../ui/overlays/toasts.ts';
import { signingWords } from '../../../words/signing.ts';
import { useAct } from '../use-act.ts';
import { ActError } from './act-dialog.tsx';
import { SignDialog } from './sign-dialog.tsx';

interface SignFlowProps {
  readonly place: Place;
  readonly part: string;
  readonly values: Evidence;
  readonly performedOn: PlainDate;
  readonly title: string;
  readonly signer: string;
  readonly colleagues: readonly ComboboxOption[];
  readonly titleOf: (key: string) => string;
  readonly onClose: () => void;
}

/** Fetches what would be signed, then signs exactly that. */
export function SignFlow(props: SignFlowProps) {
  const { place, part, values, performedOn, title, onClose } = props;
  const client = useQueryClient();
  const options = useMemo(
    () => pathwayMutations.signingSheet({ childId: place.childId, milestone: place.milestone }),
    [place.childId, place.milestone],
  );
  const read = useMutation(options);
  const sign = useAct(pathwayMutations.sign, place);
  const readSheet = () => read.mutate({ part, performedOn, values });
  const readFirst = useEffectEvent(readSheet);
  useEffect(() => readFirst(), []);

  const submit = (of: {
    readonly password: string;
    readonly overrides: readonly { check: string; reason: string; secondName: string | null }[];
  }) => {
    const body = {
      part,
      performedOn,
      values,
      digest: read.data?.digest ?? '',
      password: of.password,
      overrides: [...of.overrides],
    };
    sign.mutate(
      { body },
      {
        onSuccess: () => {
          showToast({ text: signingWords.signed(title) });
          onClose();
        },
        onError: (error) => {
          if (isProblem(error, 'signed-content-changed')) readSheet();
          if (!isProblem(error, 'milestone-already-signed')) return;
          // What the other person signed is shown beside what was typed here.
          void client.invalidateQueries({ queryKey: pathwayQueries.ofChild(place.childId).queryKey, exact: true });
          onClose();
        },
      },
    );
  };

  if (read.data === undefined) {
    return (
      <Dialog isOpen onClose={onClose} title={signingWords.signTitle}>
        {read.isError ? <ActError error={read.error} /> : <Loading rows={['']} />}
      </Dialog>
    );
  }
  return (
    <SignDialog
      sheet={read.data}
      signer={props.signer}
      colleagues={props.colleagues}
      titleOf={props.titleOf}
      isBusy={sign.isPending}
      error={sign.error}
      isChanged={isProblem(sign.error, 'signed-content-changed')}
      onClose={onClose}
      onSign={submit}
    />
  );
}
