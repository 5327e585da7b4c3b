import type { AmmoniaBasis } from '../../../domain/ammonia/nitrogen-forms.ts'

/** Grams of each form with a gram of nitrogen in it, as the working writes them. */
export const ammoniaRatioTerms: Readonly<Record<AmmoniaBasis, string>> = {
  n: '1',
  nh3: '17.031 / 14.007',
  nh4: '18.039 / 14.007',
}
