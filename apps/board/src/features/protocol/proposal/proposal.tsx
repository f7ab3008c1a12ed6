import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useDeferredValue, useMemo, useState } from 'react';
import type { Protocol } from '@weftway/pathway/protocol';
import { readProtocol } from '@weftway/pathway/protocol-faults';
import type { ProtocolFault } from '@weftway/pathway/protocol-faults';
import { ApiProblem } from '../../../api/api-client.ts';
import { protocolMutations } from '../../../queries/protocol-queries.ts';
import { Segment } from '../../../ui/actions/segment.tsx';
import { Button } from '../../../ui/actions/button.tsx';
import { TextField } from '../../../ui/fields/text-field.tsx';
import { ProblemNotice } from '../../../ui/notices/problem-notice.tsx';
import { showToast } from '../../../ui/overlays/toasts.ts';
import { Section } from '../../../ui/page/section.tsx';
import { protocolWords } from '../../../words/protocol.ts';
import { ChangeList } from '../versions/change-list.tsx';
import { protocolChanges } from '../versions/protocol-changes.ts';
import { faultsByPlace, takenBack } from './draft-protocol.ts';
import { FaultList } from './fault-list.tsx';
import { FileForm } from './file-form.tsx';
import { brokenLine } from './json-places.ts';
import { NumberForm } from './number-form.tsx';
import { SettingsForm } from './settings-form.tsx';

const words = protocolWords.proposal;
const ways = [
  { value: 'form', label: words.form },
  { value: 'file', label: words.file },
] as const;

interface ProposalProps {
  readonly from: Protocol;
  readonly onSaved: (version: number) => void;
}

const shown = (protocol: Protocol): string => JSON.stringify(protocol, null, 2);

/** A text read as JSON, or the line at which it stops being that. */
const readText = (text: string): { readonly document: unknown; readonly brokenAt: number | null } => {
  try {
    return { document: JSON.parse(text) as unknown, brokenAt: null };
  } catch (error) {
    return { document: null, brokenAt: brokenLine(text, error) };
  }
};

/** What would be saved, and what is wrong with it. */
const useDraft = (from: Protocol) => {
  const [draft, setDraft] = useState(from);
  const [text, setText] = useState<string | null>(null);
  const reading = useMemo(
    () => (text === null ? { document: draft as unknown, brokenAt: null } : readText(text)),
    [text, draft],
  );
  const judged = useDeferredValue(reading);
  const verdict = useMemo(() => readProtocol(judged.document), [judged]);
  const faults = verdict.ok ? [] : verdict.faults;
  const candidate = verdict.ok ? verdict.protocol : text === null ? draft : null;
  const changes = useMemo(() => (candidate === null ? [] : protocolChanges(from, candidate)), [from, candidate]);
  return {
    draft,
    setDraft,
    text,
    setText,
    document: reading.document,
    brokenAt: reading.brokenAt,
    faults,
    candidate,
    changes,
  };
};

interface KeepPanelProps {
  readonly document: unknown;
  readonly brokenAt: number | null;
  readonly faults: readonly ProtocolFault[];
  readonly isChanged: boolean;
  readonly onSaved: (version: number) => void;
}

const notYetBecause = ({ brokenAt, faults, isChanged }: KeepPanelProps): string | null => {
  if (faults.length > 0 || brokenAt !== null) return words.notYetFaults;
  return isChanged ? null : words.notYetChanges;
};

/** Asks the server to check, and keeps the draft. Starts anew with every other document. */
function KeepPanel(props: KeepPanelProps) {
  const { document, brokenAt, onSaved } = props;
  const client = useQueryClient();
  const check = useMutation(protocolMutations.check());
  const add = useMutation(protocolMutations.add(client));
  const [why, setWhy] = useState('');
  const [hasTried, setTried] = useState(false);
  const isFresh = check.variables === document;
  const found = isFresh ? (check.data?.faults ?? []) : [];
  const checked = isFresh && check.isSuccess ? (found.length === 0 ? words.checked : words.faults(found.length)) : '';
  const save = () => {
    setTried(true);
    if (why.trim() === '') return;
    const saved = (head: { readonly version: number }) => {
      showToast({ text: words.saved(head.version) });
      onSaved(head.version);
    };
    add.mutate({ protocol: document, changes: why }, { onSuccess: saved });
  };
  return (
    <>
      {found.length > 0 && props.faults.length === 0 ? (
        <FaultList
          faults={found.map(({ milestone, ...rest }) => (milestone === undefined ? rest : { ...rest, milestone }))}
        />
      ) : null}
      <div className="flex flex-wrap items-center gap-2">
        <Button
          onClick={() => check.mutate(document)}
          isBusy={check.isPending}
          notYet={brokenAt === null ? null : words.notJson(brokenAt)}
        >
          {words.check}
        </Button>
        <span role="status" className="text-small text-ink-2">
          {checked}
        </span>
      </div>
      <TextField
        label={words.why}
        hint={words.whyHint}
        name="why"
        value={why}
        onChange={setWhy}
        maxLength={500}
        error={hasTried && why.trim() === '' ? words.whyMissing : undefined}
      />
      {add.error instanceof ApiProblem ? <ProblemNotice problem={add.error.problem} /> : null}
      <div className="flex flex-wrap items-center gap-2">
        <Button look="filled" onClick={save} isBusy={add.isPending} notYet={notYetBecause(props)}>
          {words.save}
        </Button>
      </div>
    </>
  );
}

/** Changes a version by its common numbers or as a whole file; every fault is shown at its place. */
export function Proposal({ from, onSaved }: ProposalProps) {
  const { draft, setDraft, text, setText, document, brokenAt, faults, candidate, changes } = useDraft(from);
  const byPlace = useMemo(() => faultsByPlace(faults), [faults]);
  const turnTo = (way: 'form' | 'file') => {
    if (way === 'file') setText(shown(draft));
    else if (candidate !== null) {
      setDraft(candidate);
      setText(null);
    }
  };
  const takeBack = text === null ? (id: string | null) => setDraft(takenBack(draft, from, id)) : undefined;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_minmax(0,26rem)] gap-x-10 gap-y-8 px-6 py-5 max-lg:grid-cols-1 max-sm:px-5">
      <div className="flex min-w-0 flex-col gap-6">
        <Segment label={words.how} options={ways} value={text === null ? 'form' : 'file'} onChange={turnTo} />
        {text === null ? (
          <>
            <Section title={words.settings}>
              <SettingsForm draft={draft} onChange={setDraft} faults={byPlace} />
            </Section>
            <Section title={words.oneMilestone}>
              <NumberForm draft={draft} onChange={setDraft} faults={byPlace} />
            </Section>
          </>
        ) : (
          <FileForm text={text} onChange={setText} brokenAt={brokenAt} faults={faults} />
        )}
      </div>
      <div className="flex min-w-0 flex-col gap-5">
        <Section title={words.changesTitle}>
          {changes.length === 0 ? (
            <p className="text-body text-ink-2 m-0">{candidate === null ? words.formNeedsFile : words.noChanges}</p>
          ) : (
            <ChangeList changes={changes} onTakeBack={takeBack} />
          )}
        </Section>
        {text === null && faults.length > 0 ? <FaultList faults={faults} /> : null}
        <KeepPanel
          document={document}
          brokenAt={brokenAt}
          faults={faults}
          isChanged={changes.length > 0}
          onSaved={onSaved}
        />
      </div>
    </div>
  );
}
