import { defineMessages } from './define-messages.ts'

/** Why a value for a threshold is refused. @param p.limit the limit that it breaks, with its unit */
export const ruleProblemWords = defineMessages({
  'no-such-parameter': (_: { limit: string }) => 'The rule has no such threshold.',
  'not-a-number': (_: { limit: string }) => 'Type a number with a decimal point, for example 5.5.',
  'other-unit': (_: { limit: string }) => 'The threshold has another unit. Give the value in that one.',
  'not-above-zero': (_: { limit: string }) => 'It has to be above zero.',
  'below-least': (p: { limit: string }) =>
    `It has to be at least ${p.limit}: less makes no sense for this rule.`,
  'above-most': (p: { limit: string }) => `It can be at most ${p.limit}: more makes no sense for this rule.`,
  jurisdictionNeeded:
    'This limit was read at its source. To loosen it, say which jurisdiction allows the value you confirm.',
  jurisdictionOther: 'The facility does not accept this jurisdiction. Choose one of those in its settings.',
  newerProposed: (p: { value: string; by: string }) =>
    `${p.by} has proposed ${p.value} since. Read it again, then decide.`,
  readAgain: 'It stands differently by now. Read it again, then decide.',
})
