/** Each problem that the API can answer with, explained: what happened and what helps. */
import type { ProblemName } from '@weftway/contract/problems';

interface Explained {
  readonly happened: string;
  readonly helps: string;
}

export const problemWords: Readonly<Record<ProblemName, Explained>> = {
  'bad-input': {
    happened: 'Something in what was sent is missing or cannot be what it says.',
    helps: 'The fields in question are named. Mend them and send again; nothing was changed.',
  },
  'not-signed-in': {
    happened: 'Nobody is signed in, or the session has ended after quiet minutes.',
    helps: 'Sign in again. What you typed stays in the window.',
  },
  'wrong-credentials': {
    happened: 'The e-mail and the password do not belong together, or the account waits after many tries.',
    helps: 'Check both. After several tries wait a little, or ask for a letter to set a new password.',
  },
  'wrong-password': {
    happened: 'The password that confirms an act is not the one of the person who is signed in.',
    helps: 'Type your own password again. After several tries there is a short wait.',
  },
  'not-allowed': {
    happened: 'You may see this, but somebody of another role does it.',
    helps: 'Ask the person who is named, or the coordinator.',
  },
  'forged-request': {
    happened: 'The request did not carry the token of your session, or came from another site.',
    helps: 'Reload the page and try again. If you did not do anything, tell your administrator.',
  },
  'not-found': {
    happened: 'There is nothing at this address, or nothing that you can open.',
    helps: 'Check the address. If you expected a child here, ask the coordinator.',
  },
  'milestone-already-claimed': {
    happened: 'A colleague took this milestone on before you.',
    helps: 'Ask them to hand it over, or choose another.',
  },
  'milestone-not-yours': {
    happened: 'Somebody else holds this milestone now.',
    helps: 'Look at the list again; the holder or the coordinator can hand it over.',
  },
  'milestone-already-signed': {
    happened: 'The milestone, or this half of it, is signed.',
    helps: 'A signature is final. Put it right by an amendment, which is a further signed entry.',
  },
  'milestone-not-ready': {
    happened: 'Something that the protocol asks for is missing.',
    helps: 'The missing evidence or the milestone that it waits for is named.',
  },
  'milestone-state-refuses': {
    happened: 'The milestone is in a state that does not allow this.',
    helps: 'Open the milestone again to see its state now.',
  },
  'signed-content-changed': {
    happened: 'What you were about to sign has changed since you opened it.',
    helps: 'Open it again, read it, and sign what stands there now.',
  },
  'work-left-unowned': {
    happened: 'Open milestones would be left without anybody who holds them.',
    helps: 'Give each one to a colleague, or let it go on purpose.',
  },
  'duplicate-record': {
    happened: 'A record with the same mark exists already.',
    helps: 'Open that one, or change what makes them the same.',
  },
  'import-has-faults': {
    happened: 'Rows of the file have faults, so nothing was written.',
    helps: 'Mend the rows that are named and bring the file in again.',
  },
  'already-done': { happened: 'This was done before.', helps: 'There is nothing left to do.' },
  'link-not-valid': {
    happened: 'The link was used before, has run out, or a newer one took its place.',
    helps: 'Ask for another letter.',
  },
  'changed-meanwhile': {
    happened: 'Somebody changed this after you opened it.',
    helps: 'Compare what stands there now with what you typed, and decide what to keep.',
  },
  'too-large': { happened: 'More was sent than is taken in one go.', helps: 'Send less, or in parts.' },
  'wrong-type': { happened: 'The content is of a type that is not read here.', helps: 'Changes are sent as JSON.' },
  'same-key-other-body': {
    happened: 'A repeated request carried the key of another one.',
    helps: 'Use a new key for a new intent.',
  },
  'protocol-has-faults': {
    happened: 'The protocol contradicts itself or names what does not exist.',
    helps: 'Each fault is named with its place.',
  },
  'version-needed': {
    happened: 'The change did not say which version it is based on.',
    helps: 'Read first, then send the version along.',
  },
  'too-many': { happened: 'Too many tries or requests in a short time.', helps: 'Wait a minute, then go on.' },
  surprise: {
    happened: 'Something went wrong on our side.',
    helps: 'What was saved before is safe. Try again; if it stays, tell your administrator the reference.',
  },
};
