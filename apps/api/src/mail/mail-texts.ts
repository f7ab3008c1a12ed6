/**
 * The letters we send. Fixed subjects; no clinical word, no child's name; a link that opens one thing, once. The token
 * stands behind `#`, so that it reaches no server log on its way.
 */
export interface Letter {
  readonly subject: string;
  readonly text: string;
}

const foot = (team: string): string =>
  `\n\n${team}\nThis letter was sent by Weftway, the team's working board. Nobody reads answers to it.`;

export const resetLetter = (origin: string, token: string, team: string): Letter => ({
  subject: 'Set a new Weftway password',
  text: `Somebody asked for a new password for your account.\n\nTo set one, open this within 30 minutes:\n${origin}/new-password#${token}\n\nIf it was not you, do nothing: your password stays as it is.${foot(team)}`,
});

export const invitationLetter = (origin: string, token: string, team: string): Letter => ({
  subject: 'You are invited to Weftway',
  text: `${team} invites you to its working board.\n\nTo join, open this within 7 days and choose a password:\n${origin}/invitation#${token}\n\nIf you did not expect this, do nothing.${foot(team)}`,
});

export const passwordChangedLetter = (team: string): Letter => ({
  subject: 'Your Weftway password was changed',
  text: `The password of your account was changed, and every other session was ended.\n\nIf it was not you, ask for a new password on the sign-in page and tell your administrator.${foot(team)}`,
});

export const addressChangedLetter = (team: string): Letter => ({
  subject: 'Your Weftway address was changed',
  text: `An administrator changed the e-mail address of your account. Letters go to the new address from now on.\n\nIf this is a surprise, tell your administrator.${foot(team)}`,
});
