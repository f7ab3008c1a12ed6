/**
 * The record of one part while it is being typed. It keeps itself as a draft on the server; when somebody else changed
 * the same draft, the two are put together field by field, and only fields that both changed are asked about.
 */
import { useQueryClient } from '@tanstack/react-query';
import { readPlainDate, type PlainDate } from '@weftway/calendar/plain-date';
import type { Draft, Evidence, EvidenceValue } from '@weftway/contract/pathway';
import type { EvidenceField } from '@weftway/pathway/protocol';
import { useEffect, useEffectEvent, useState } from 'react';
import { isProblem } from '../../../api/api-client.ts';
import { pathwayMutations, pathwayQueries, type Place } from '../../../queries/pathway-queries.ts';
import { faultOf, fromDay, mergeDrafts, sameEvidence, type Merge } from '../model/evidence.ts';
import { useAct } from '../use-act.ts';

interface Local {
  readonly values: Evidence;
  /** ISO text, or what was typed so far. */
  readonly performedOn: string;
}

interface Kept extends Local {
  readonly version: number;
  readonly at: string | null;
  readonly isReady: boolean;
}

const quietMs = 900;

const keptOf = (draft: Draft | null): Kept => ({
  values: draft?.values ?? {},
  performedOn: draft?.performedOn ?? '',
  version: draft?.version ?? 0,
  at: draft?.at ?? null,
  isReady: draft?.isReady ?? false,
});

const dayOf = (text: string): PlainDate | null => {
  const reading = readPlainDate(text);
  return reading.kind === 'date' ? reading.date : null;
};

/** Values that cannot be, or that still want to be confirmed, are not sent; they stay on the screen. */
const sendable = (fields: readonly EvidenceField[], values: Evidence): Evidence =>
  Object.fromEntries(
    fields.flatMap((field) => {
      const value = values[field.name];
      return value === undefined || faultOf(values, field) !== null ? [] : [[field.name, value] as const];
    }),
  );

interface DraftOf {
  readonly place: Place;
  readonly part: string;
  readonly draft: Draft | null;
  readonly fields: readonly EvidenceField[];
  readonly birth: PlainDate | null;
  readonly today: PlainDate;
  readonly isEditable: boolean;
  /** Number of the occurrence that is awaited; a new one begins with an empty record. */
  readonly occurrence: number;
}

export const useEvidenceDraft = ({ place, part, draft, fields, birth, today, isEditable, occurrence }: DraftOf) => {
  const client = useQueryClient();
  const save = useAct(pathwayMutations.saveDraft, place);
  const [kept, setKept] = useState(() => keptOf(draft));
  const [local, setLocal] = useState<Local>(kept);
  const [sent, setSent] = useState<Evidence | null>(null);
  const [both, setBoth] = useState<Merge['both']>([]);
  const [isMerged, setMerged] = useState(false);
  const [isTouched, setTouched] = useState(false);
  const dayToKeep = (text: string): PlainDate | null => {
    const day = dayOf(text);
    return day !== null && day > today ? null : day;
  };
  const isSame = (a: Local, b: Local): boolean =>
    dayToKeep(a.performedOn) === dayToKeep(b.performedOn) &&
    sameEvidence(sendable(fields, a.values), sendable(fields, b.values));

  const [begun, setBegun] = useState(occurrence);
  const [lost, setLost] = useState<{ readonly values: Evidence; readonly occurrence: number } | null>(null);

  if (begun !== occurrence) {
    const fresh = keptOf(draft);
    setBegun(occurrence);
    // A kept draft is lost too: it went with the occurrence that somebody signed.
    setLost(isTouched ? { values: local.values, occurrence: begun } : null);
    setKept(fresh);
    setLocal(fresh);
    setTouched(false);
    setBoth([]);
  }

  // A newer draft came in: our own just kept, or somebody else's.
  if (draft !== null && draft.version > kept.version) {
    const theirs = keptOf(draft);
    const isOwn = sent !== null && sameEvidence(sent, theirs.values);
    const merge = isOwn ? null : mergeDrafts(kept.values, local.values, theirs.values);
    setKept(theirs);
    if (merge !== null) {
      setLocal({
        values: merge.values,
        performedOn: local.performedOn === kept.performedOn ? theirs.performedOn : local.performedOn,
      });
      setBoth(merge.both);
      setMerged(isTouched);
    }
  }

  const isDirty = isEditable && isTouched && !isSame(local, kept);

  const keep = (now: Local, isReady: boolean) => {
    const values = sendable(fields, now.values);
    setSent(values);
    const body = { part, values, performedOn: dayToKeep(now.performedOn), isReady };
    return save.mutateAsync({ body, ifMatch: kept.version }).catch((error: unknown) => {
      if (isProblem(error, 'changed-meanwhile'))
        void client.invalidateQueries({ queryKey: pathwayQueries.ofChild(place.childId).queryKey, exact: true });
      return null;
    });
  };
  const keepQuietly = useEffectEvent(() => void keep(local, kept.isReady));

  useEffect(() => {
    if (!isDirty || save.isPending || both.length > 0) return;
    const timer = setTimeout(keepQuietly, quietMs);
    return () => clearTimeout(timer);
  }, [isDirty, local, save.isPending, both.length, kept.version]);

  const change = (name: string, value: EvidenceValue) => {
    setTouched(true);
    setLocal((was) => ({ ...was, values: { ...was.values, [name]: value } }));
  };
  const changeDay = (day: string) => {
    setTouched(true);
    setLocal((was) => ({ performedOn: day, values: fromDay(fields, was.values, day, was.performedOn, birth) }));
  };
  const choose = (name: string, value: EvidenceValue) => {
    change(name, value);
    setBoth((was) => was.filter((one) => one.name !== name));
  };
  const status = save.isPending
    ? 'saving'
    : isDirty
      ? save.isError
        ? 'failed'
        : 'typing'
      : kept.at === null
        ? 'none'
        : 'kept';
  return {
    values: local.values,
    performedOn: local.performedOn,
    day: dayOf(local.performedOn),
    isReady: kept.isReady,
    keptAt: kept.at,
    status: status as 'saving' | 'failed' | 'typing' | 'none' | 'kept', // the four words above
    isTouched,
    /** What was typed here when somebody else signed that occurrence. */
    lost,
    isMerged,
    both,
    change,
    changeDay,
    choose,
    /** Keeps what stands now, at once. */
    keepNow: () => (isDirty ? keep(local, kept.isReady) : Promise.resolve(null)),
    setReady: (isReady: boolean) => keep(local, isReady),
  };
};

export type EvidenceDraft = ReturnType<typeof useEvidenceDraft>;
