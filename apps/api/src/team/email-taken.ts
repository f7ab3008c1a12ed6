/** The refusal of an address that somebody on the team has. */
import type { Member } from '@weftway/contract/member';
import { refused } from '../http/outcome.ts';
import type { Refused } from '../http/outcome.ts';

export const emailTaken = (known: Member): Refused =>
  refused('duplicate-record', {
    detail: `${known.name} has this address.`,
    errors: [{ pointer: '/email', detail: `This is the address of ${known.name}.` }],
  });
