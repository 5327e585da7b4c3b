import { defineMessages } from './define-messages.ts'

/** Words of signing in, and of the first change of a one-time password. */
export const signInWords = defineMessages({
  title: 'Sign in',
  source: 'Medical records and quarantine. Soundings in metres, doses in milligrams, times in facility time.',
  email: 'E-mail',
  password: 'Password',
  signIn: 'Sign in',
  signingIn: 'Signing in…',
  forgotten: 'Forgotten it? Ask an administrator for a one-time password.',
  lockout: '5 wrong tries lock the account for 15 minutes.',
  typeEmail: 'Type your e-mail address, for example i.marrow@harrow-point.example.',
  typePassword: 'Type your password.',
  nightWatch: 'Night watch',
  dayWatch: 'Day',

  newTitle: 'A password of your own',
  newSource: (p: { name: string }) =>
    `Signed in as ${p.name} with a one-time password. Choose your own before you go on.`,
  currentPassword: 'One-time password',
  newPassword: 'New password',
  newHint: 'At least 10 characters. A few words are easier to keep than signs.',
  again: 'New password again',
  notSame: 'The two are not the same. Type the new password twice.',
  tooShort: 'Use at least 10 characters.',
  sameAsOld: 'Choose another password than the one-time one.',
  keepIt: 'Keep this password',
  changed: 'Your password is changed',
  signOutInstead: 'Sign out instead',

  seaSound: 'Norrell Sound',
  seaSallows: 'The Sallows',
  seaPoint: 'Harrow Point',
  seaRoad: 'Pratique Road',
  seaBank: 'Ledder Bank',
  seaDay: (p: { day: number }) => `day ${p.day}`,
})
