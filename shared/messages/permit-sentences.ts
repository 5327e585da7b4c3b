import type { PermitMark } from '../domain/register/judge-permit-use.ts'
import { counted, defineMessages } from './define-messages.ts'

/** What a permit is asked about when it does not cover a use; dates as written on the wire. */
export interface PermitFacts {
  permit: string
  validFrom: string
  validUntil: string
  /** Whole animals left before the use; may be negative. */
  remaining: number
  /** Whole animals of the use. */
  wanted: number
  /** Whole animals alive in the line that it is used for. */
  alive: number
}

const animals = (count: number) => counted(count, 'animal', 'animals')

/** What the server says about permits. */
export const permitSentences = defineMessages({
  'over-quantity': (p: PermitFacts) =>
    p.remaining <= 0
      ? `Permit ${p.permit} is used up; this takes ${animals(p.wanted)} more.`
      : `Permit ${p.permit} has ${animals(p.remaining)} left; this takes ${animals(p.wanted)}.`,
  'not-yet-valid': (p: PermitFacts) => `Permit ${p.permit} is valid only from ${p.validFrom}.`,
  expired: (p: PermitFacts) => `Permit ${p.permit} ended on ${p.validUntil}.`,
  'other-taxon': (p: PermitFacts) => `Permit ${p.permit} does not name this taxon.`,
  voided: (p: PermitFacts) => `Permit ${p.permit} is void.`,
  'fewer-than-animals': (p: PermitFacts) =>
    `${animals(p.alive)} are in the line, but fewer are taken under permit ${p.permit} and others of its kind. Take all of them, or name the permit for the rest.`,
  'more-than-animals': (p: PermitFacts) =>
    `Only ${animals(p.alive)} are in the line, but more are taken under permit ${p.permit} and others of its kind. Correct the number.`,
  ifItHappened: 'If it has already happened, say so: then it is kept and marked.',
  lastDayFirst: 'The last day has to be on or after the first day.',
  numberTaken:
    'A permit of this authority with this number is on file. Void it first if it was entered wrongly.',
  noSuchPermit: 'There is no such permit on file.',
  noSuchParty: 'There is no such party on file.',
  noSuchTaxon: 'A taxon named here is not in the list of taxa.',
} satisfies Record<PermitMark, (p: PermitFacts) => string> & Record<string, unknown>)
