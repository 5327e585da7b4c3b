import type { BenchCaution } from '../../definition.ts'

/** What every copper in a water asks to be said, whatever it is dosed by. */
export const copperWords = {
  'caution.invertebrates':
    'Copper kills invertebrates, and sharks, rays and some bony fish at the level of treatment. Rock and sand take it up and give it back later. Look who lives in this water first.',
  'caution.one-kind':
    'Never use copper sulfate and a chelated copper in one course, nor the target of one for the other (from memory). Ask which copper is in this water already.',
} as const

/** Cautions that stand beside every amount of copper. @source treatment-practice */
export const copperCautions = [
  { code: 'invertebrates', level: 'warning' },
  { code: 'one-kind', level: 'warning' },
] as const satisfies readonly BenchCaution[]
