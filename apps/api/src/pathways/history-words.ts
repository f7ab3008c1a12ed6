/** One line per change of a child's pathway, for the history beside it. Values of evidence are never in it. */
import { formatDate } from '@weftway/calendar/format-date';
import type { PlainDate } from '@weftway/calendar/plain-date';
import type { EventPayloads } from '../trail/trail-event.ts';

type Names = (memberId: string) => string;
type Words = { readonly [K in keyof EventPayloads]?: (after: EventPayloads[K], names: Names) => string };

const spokenDate = (date: string): string => formatDate(date as PlainDate); // dates in the trail were checked when they were written

const because = (reason: string): string => (reason === '' ? '' : `: ${reason}`);

const words: Words = {
  'child-registered': () => 'Put on the list',
  'child-edited': () => 'Record changed',
  'child-transferred': ({ on, to }) => `Care moved to ${to === '' ? 'another team' : to} on ${spokenDate(on)}`,
  'child-returned': () => 'Care came back to this team',
  'care-ended': ({ on }) => `Care ended on ${spokenDate(on)}`,
  'trainees-assigned': ({ memberIds }, names) =>
    memberIds.length === 0 ? 'No trainee any more' : `Trainees: ${memberIds.map(names).join(', ')}`,
  'lead-handed-on': ({ leadClinicianId }, names) =>
    leadClinicianId === null ? 'No lead clinician any more' : `Led by ${names(leadClinicianId)} from now on`,
  'child-moved-to-protocol': ({ version, reason }) => `Moved to protocol ${version}${because(reason)}`,
  'milestone-claimed': ({ memberId }, names) => `Taken on by ${names(memberId)}`,
  'milestone-released': ({ memberId, reason }, names) => `Let go by ${names(memberId)}${because(reason)}`,
  'milestone-handed-over': ({ from, to, reason }, names) =>
    `Handed ${from === null ? '' : `from ${names(from)} `}to ${names(to)}${because(reason)}`,
  'draft-saved': ({ isReady }) => (isReady ? 'Draft ready to be signed' : 'Draft kept'),
  'milestone-signed': ({ signature }) =>
    `Signed by ${signature.signerName}, ${signature.signerRole} (${signature.meaning}), for ${spokenDate(signature.performedOn)}${signature.draftedByName === null ? '' : `; drafted by ${signature.draftedByName}`}${signature.overrides.length === 0 ? '' : `; signed past ${signature.overrides.map(({ check }) => check).join(', ')}`}`,
  'signature-amended': ({ signature }) =>
    `Amended by ${signature.signerName}, ${signature.signerRole}${because(signature.amendReason ?? '')}`,
  'milestone-held': ({ reason, reviewOn }) => `On hold until ${spokenDate(reviewOn)}${because(reason)}`,
  'hold-lifted': () => 'Hold lifted',
  'milestone-waived': ({ kind, reason, secondName, offerAgainOn }) =>
    `${kind === 'waived' ? 'Waived' : 'Not recoverable'}${because(reason)}${secondName === null ? '' : `; decided with ${secondName}`}${offerAgainOn === null ? '' : `; offered again on ${spokenDate(offerAgainOn)}`}`,
  'booking-set': ({ on, reason }) => `Booked for ${spokenDate(on)}${because(reason)}`,
  'booking-removed': ({ reason }) => `Booking taken back${because(reason)}`,
  'finding-recorded': ({ name, on, note }) => `Found: ${name.replaceAll('_', ' ')}, ${spokenDate(on)}${because(note)}`,
  'finding-withdrawn': ({ name, note }) => `Finding withdrawn: ${name.replaceAll('_', ' ')}${because(note)}`,
  'own-milestone-added': ({ rule, reason }) => `Added “${rule.title}”${because(reason)}`,
  'history-imported': ({ performedOn, source }) => `Done elsewhere on ${spokenDate(performedOn)} (${source})`,
  'import-confirmed': () => 'Operation done elsewhere confirmed',
};

export const historyLine = (kind: string, after: unknown, names: Names): string => {
  // The trail holds the payload of exactly this kind; kinds without words are named as they are.
  const word = words[kind as keyof EventPayloads] as ((after: unknown, names: Names) => string) | undefined;
  return word === undefined ? kind.replaceAll('-', ' ') : word(after, names);
};
