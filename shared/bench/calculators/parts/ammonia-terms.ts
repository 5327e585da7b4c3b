import type { AmmoniaBasis } from '../../../domain/ammonia/nitrogen-forms.ts'

/** Grams of each form with a gram of nitrogen in it, as the working writes them. */
const ratioTerms = { nh3: '17.031 / 14.007', nh4: '18.039 / 14.007' } as const

/** A term of the working counted as nitrogen. */
export function asNitrogenTerm(term: string, of: AmmoniaBasis): string {
  return of === 'n' ? term : `${term} / (${ratioTerms[of]})`
}

/** A term that is counted as nitrogen, counted as another form. */
export function fromNitrogenTerm(term: string, as: AmmoniaBasis): string {
  return as === 'n' ? term : `${term} * (${ratioTerms[as]})`
}
