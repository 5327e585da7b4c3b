import { disinfectionLimits } from '../../domain/disinfection/disinfection-limits.ts'
import { appliedOzoneDose, ozoneForDose } from '../../domain/disinfection/ozone-dose.ts'
import { ok, refuse } from '../../domain/result.ts'
import { convert } from '../../domain/units/convert.ts'
import { enteredTerm } from '../../domain/working/entered-term.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { line } from '../line.ts'

/** Ozone put into a flow of water, or what a generator has to make for it. */
export const ozoneDose = defineCalculator({
  id: 'ozone-dose',
  group: 'water',
  words: defineMessages({
    name: 'Ozone dose',
    purpose: 'Ozone put into a flow of water, or what a generator has to make for a dose.',
    formula: 'dose = ozone an hour ÷ flow',
    'input.find': 'What to find',
    'option.find.dose': 'The dose that is applied',
    'option.find.output': 'What the generator has to make',
    'input.ozone': 'Ozone from the generator',
    'help.ozone': 'What it really makes on this feed gas and setting: the plate says the most.',
    'input.dose': 'Dose to apply',
    'input.flow': 'Flow of water',
    'result.dose': 'Dose applied',
    'result.ozone': 'Ozone to make',
    'line.dose': 'Ozone in the water that passes',
    'line.ozone': 'Ozone for the water that passes',
    'caution.not-a-residual':
      'A dose applied is no residual: the gas does not all dissolve, and the water uses it up. Test what is left.',
    'caution.sea-water':
      'In sea water ozone makes bromine and bromate, which stay (common practice, from memory). Measure total residual oxidants before the water meets animals.',
    'caution.under-treatment':
      'Do not put ozone into a system under drug treatment: it destroys the drug, or makes something else of it.',
  }),
  inputs: {
    find: choice(['dose', 'output']),
    ozone: quantity({
      units: ['g/h', 'mg/h'],
      limits: { min: 0, max: disinfectionLimits.mostOzoneGPerH },
      when: { find: ['dose'] },
    }),
    dose: quantity({
      units: ['mg/L', 'g/m3', 'ug/L'],
      limits: { min: 0, max: disinfectionLimits.mostOzoneMgPerL, plausible: { max: 5 } },
      when: { find: ['output'] },
    }),
    flow: quantity({
      units: ['m3/h', 'L/min', 'L/h', 'mL/min', 'gal_us/min'],
      limits: { above: 0, max: disinfectionLimits.mostFlowLPerMin },
    }),
  },
  fields: { ozoneGPerH: 'ozone', doseMgPerL: 'dose', flowM3PerH: 'flow' },
  example: {
    find: 'dose',
    ozone: { value: '20', unit: 'g/h' },
    flow: { value: '40', unit: 'm3/h' },
  },
  sources: ['mass-balance', 'ozone-practice'],
  cautions: [
    { code: 'not-a-residual', level: 'note' },
    { code: 'sea-water', level: 'warning' },
    { code: 'under-treatment', level: 'warning' },
  ],
  published: ['ozone_dose_mg_per_L'],
  compute({ find, ozone, dose, flow }) {
    const perHour = convert(flow.value, 'L/min', 'm3/h')
    if (!perHour.ok) return perHour
    if (find === 'output') {
      if (!dose) return refuse('blank', 'dose', { unit: 'mg/L' })
      const needed = ozoneForDose({ doseMgPerL: dose.value, flowM3PerH: perHour.value })
      if (!needed.ok) return needed
      const expression = `${enteredTerm(dose)} * ${enteredTerm(flow)} to g/hour`
      return ok({
        figures: [{ key: 'ozone', value: needed.value, unit: 'g/h', figures: 3 }],
        working: [line('ozone', expression, needed.value, 'g/h')],
      })
    }
    if (!ozone) return refuse('blank', 'ozone', { unit: 'g/h' })
    const applied = appliedOzoneDose({ ozoneGPerH: ozone.value, flowM3PerH: perHour.value })
    if (!applied.ok) return applied
    const expression = `${enteredTerm(ozone)} / (${enteredTerm(flow)}) to mg/L`
    return ok({
      figures: [{ key: 'dose', value: applied.value, unit: 'mg/L', figures: 3 }],
      working: [line('dose', expression, applied.value, 'mg/L')],
    })
  },
})
