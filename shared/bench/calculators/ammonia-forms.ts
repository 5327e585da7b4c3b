import { ammoniaBases, ammoniaCountedAs } from '../../domain/ammonia/nitrogen-forms.ts'
import { ok } from '../../domain/result.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'
import { asNitrogenTerm, fromNitrogenTerm } from './parts/ammonia-terms.ts'

const bases = { n: 'As nitrogen (N)', nh3: 'As NH₃', nh4: 'As NH₄' }

/** The same ammonia counted as nitrogen, as NH3 or as NH4. */
export const ammoniaForms = defineCalculator({
  id: 'ammonia-forms',
  group: 'units',
  words: defineMessages({
    name: 'Ammonia as N, NH₃ or NH₄',
    purpose: 'Tests count the same ammonia as nitrogen, as NH₃ or as NH₄: from one count to another.',
    search: 'TAN nitrogen NH3 NH4',
    formula: 'as NH₃ = as N × 17.031 ÷ 14.007; as NH₄ = as N × 18.039 ÷ 14.007',
    'input.reading': 'Reading',
    'input.of': 'What the test counts it as',
    'help.of': 'It stands in the instructions of the kit.',
    'option.of.n': bases.n,
    'option.of.nh3': bases.nh3,
    'option.of.nh4': bases.nh4,
    'input.as': 'What it is wanted as',
    'option.as.n': bases.n,
    'option.as.nh3': bases.nh3,
    'option.as.nh4': bases.nh4,
    'result.counted': 'The same, counted so',
    'line.counted': 'The same, counted so',
    'refusal.ammonia-basis-not-stated':
      'Choose what the test counts ammonia as: nitrogen, NH₃ or NH₄. The same water reads 22 % or 29 % higher as NH₃ or NH₄.',
    'caution.all-of-it':
      'This is all of the ammonia, or all of its un-ionised part: counting it otherwise does not tell the two apart.',
  }),
  inputs: {
    reading: quantity({
      units: ['mg/L', 'ug/L'],
      limits: { min: 0, max: 1000, plausible: { max: 20 } },
      reading: 'total-ammonia-n',
      readingSays: { of: 'n' },
    }),
    of: choice(ammoniaBases, { missing: 'ammonia-basis-not-stated' }),
    as: choice(ammoniaBases),
  },
  fields: { mgPerL: 'reading' },
  example: { reading: { value: '1', unit: 'mg/L' }, of: 'n', as: 'nh3' },
  sources: ['iupac-weights'],
  cautions: [{ code: 'all-of-it', level: 'note' }],
  published: ['nh3_from_nh3n', 'nh3n_from_nh3', 'nh4_from_nh4n'],
  compute({ reading, of, as }) {
    const counted = ammoniaCountedAs({ mgPerL: reading.value, of, as })
    if (!counted.ok) return counted
    return ok({
      figures: [{ key: 'counted', value: counted.value, unit: 'mg/L', kind: 'reading' }],
      working: [
        line(
          'counted',
          `${fromNitrogenTerm(asNitrogenTerm(enteredTerm(reading), of), as)} to mg/L`,
          counted.value,
          'mg/L',
        ),
      ],
    })
  },
})
