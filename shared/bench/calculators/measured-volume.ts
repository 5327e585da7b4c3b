import { ok, refuse, type Refusal, type Result } from '../../domain/result.ts'
import type { ParsedQuantity } from '../../domain/units/parse-quantity.ts'
import { quantityOf } from '../../domain/units/quantity-of.ts'
import { volumeByFilling } from '../../domain/water/volume-by-filling.ts'
import { volumeByMeter } from '../../domain/water/volume-by-meter.ts'
import type { VolumeDetermination } from '../../domain/water/volume-determination.ts'
import type { VolumeSheet } from '../../domain/water/volume-sheet.ts'
import { defineMessages } from '../../messages/define-messages.ts'
import { defineCalculator, type BenchCaution, type Outcome } from '../definition.ts'
import { choice, quantity } from '../inputs.ts'
import { tracerOf, tracerOutcome, type GivenTracer } from './parts/tracer-answer.ts'
import { volumeUnits } from './parts/volume-input.ts'

const methods = ['meter', 'flow-time', 'salt', 'dye'] as const
const stirred = ['salt', 'dye'] as const
const readingUnits = ['g/L', 'mg/L', 'ug/L'] as const
/** From this share on the range is too wide to dose by without thinking. */
const widePercent = 10

/** The water that is really there, by a meter, a steady flow, or what a known amount of salt or dye makes of it. */
export const measuredVolume = defineCalculator({
  id: 'measured-volume',
  group: 'volume',
  words: defineMessages({
    name: 'Measured volume',
    purpose:
      'The water that is really there: by a water meter, by a steady flow and a watch, or by the rise that salt or a dye makes.',
    formula: 'volume = reading after − before; flow × time; amount ÷ rise',
    'input.method': 'How it was measured',
    'option.method.meter': 'A water meter, before and after filling',
    'option.method.flow-time': 'A steady flow and the time to fill',
    'option.method.salt': 'Salt stirred in',
    'option.method.dye': 'A dye or another tracer stirred in',
    'input.startReading': 'Meter before filling',
    'input.endReading': 'Meter after filling',
    'input.flow': 'Flow while filling',
    'input.duration': 'Time to fill',
    'input.saltMass': 'Salt stirred in',
    'input.purity': 'Purity of the salt',
    'help.purity': 'Left open, 100 %.',
    'input.dyeAmount': 'Tracer stirred in',
    'help.dyeAmount': 'Its mass, or millilitres of a solution of known strength.',
    'input.dyeStrength': 'Strength of its solution',
    'input.before': 'Reading before',
    'input.after': 'Reading after, all mixed',
    'input.readingError': 'Error of a reading, either way',
    'help.readingError': 'The smallest step of the instrument at least.',
    'input.error': 'Error of meter, flow or amount',
    'result.net': 'Net volume of the water',
    'result.rise': 'Rise',
    'line.added': 'Amount stirred in',
    'line.rise': 'Rise',
    'line.net': 'Net volume of the water',
    'refusal.reading-did-not-rise':
      'The reading after has to be above the one before. Check both, and that all is mixed.',
    'refusal.rise-within-error':
      'The readings alone could be off by this rise. Stir in more, or read with a finer instrument.',
    'refusal.volume-not-of-a-tank':
      'This makes less than 10 mL or more than 100,000 m³. Check the figures and their units.',
    'refusal.dye-strength-missing': 'Type the strength of the solution, or the mass of the tracer itself.',
    'caution.whole-fill':
      'The meter counts what went through it: the system has to be empty before and full to its mark after, with no other water in or out.',
    'caution.flow-falls':
      'A flow falls as the tank fills. Measure it with a bucket at the beginning and at the end, and take the mean.',
    'caution.mixed':
      'Let the water go round for several turnovers and read in more than one place, until all readings agree.',
    'caution.salt-treats':
      'Salt is a treatment too: with animals in the water only as the veterinarian says, and not where plants or fresh-water invertebrates live.',
    'caution.taken-up':
      'Dye that carbon, rock, sand or light takes away makes the volume look larger, and every dose by it too strong. Turn carbon, UV and foam fractionators off, and read soon after mixing.',
    'caution.error-not-stated':
      'No error was stated: how well this volume is known is not known. A wrong volume is a wrong dose.',
    'caution.wide': (p: { percent: string }) =>
      `The errors make more than ${p.percent} % of this volume. Stir in more, or measure another way too.`,
    'caution.second': 'A second person confirms a volume before anybody doses by it.',
  }),
  inputs: {
    method: choice(methods),
    startReading: quantity({ units: volumeUnits, limits: { min: 0 }, when: { method: ['meter'] } }),
    endReading: quantity({ units: volumeUnits, limits: { min: 0 }, when: { method: ['meter'] } }),
    flow: quantity({
      units: ['L/min', 'L/h', 'm3/h', 'gal_us/min', 'mL/min'],
      limits: { above: 0 },
      when: { method: ['flow-time'] },
    }),
    duration: quantity({
      units: ['min', 'h', 's', 'd'],
      limits: { above: 0 },
      when: { method: ['flow-time'] },
    }),
    saltMass: quantity({
      units: ['kg', 'g', 'mg', 'lb', 'oz_av', 't'],
      limits: { above: 0 },
      when: { method: ['salt'] },
    }),
    purity: quantity({
      units: ['percent_w_w'],
      limits: { above: 0, min: 0.1, max: 100, plausible: { min: 50 } },
      optional: true,
      when: { method: ['salt'] },
    }),
    dyeAmount: quantity({
      units: ['g', 'mg', 'mL', 'L', 'uL'],
      limits: { above: 0 },
      when: { method: ['dye'] },
    }),
    dyeStrength: quantity({
      units: ['mg/mL', 'g/L', 'percent_w_v', 'mg/L'],
      limits: { above: 0, max: 2_000_000 },
      optional: true,
      when: { method: ['dye'] },
    }),
    before: quantity({
      units: readingUnits,
      limits: { min: 0, max: 1_000_000 },
      when: { method: stirred },
    }),
    after: quantity({
      units: readingUnits,
      limits: { min: 0, max: 1_000_000 },
      when: { method: stirred },
    }),
    readingError: quantity({
      units: readingUnits,
      limits: { min: 0, max: 1_000_000 },
      optional: true,
      when: { method: stirred },
    }),
    error: quantity({ units: ['percent'], limits: { min: 0, max: 90 }, optional: true }),
  },
  fields: {
    errorPercent: 'error',
    addedErrorPercent: 'error',
    beforeMgPerL: 'before',
    afterMgPerL: 'after',
    readingErrorMgPerL: 'readingError',
  },
  example: {
    method: 'salt',
    saltMass: { value: '5', unit: 'kg' },
    before: { value: '1.20', unit: 'g/L' },
    after: { value: '3.20', unit: 'g/L' },
    readingError: { value: '0.05', unit: 'g/L' },
    error: { value: '1', unit: 'percent' },
  },
  sources: ['salt-balance', 'jcgm-100'],
  cautions: [{ code: 'second', level: 'note' }],
  carries: [{ to: 'volume', sheet: sheetOf }],
  compute(given) {
    const outcome = answerTo(given)
    if (!outcome.ok) return outcome
    const cautions = cautionsOf(given, outcome.value)
    return ok({ ...outcome.value, cautions })
  },
})

interface Given extends GivenTracer {
  method: (typeof methods)[number]
  startReading: ParsedQuantity | undefined
  endReading: ParsedQuantity | undefined
  flow: ParsedQuantity | undefined
  duration: ParsedQuantity | undefined
}

function answerTo(given: Given): Result<Outcome> {
  const { method, startReading, endReading, flow, duration } = given
  const errorPercent = given.error?.value ?? 0
  if (method === 'meter') {
    if (!startReading || !endReading) return refuse('blank', 'endReading', { unit: 'L' })
    const sheet = {
      method: 'metered',
      startReading: startReading.entered,
      endReading: endReading.entered,
    } as const
    return determined(volumeByMeter({ ...sheet, errorPercent }), 'endReading')
  }
  if (method === 'flow-time') {
    if (!flow || !duration) return refuse('blank', 'flow', { unit: 'L/min' })
    return determined(
      volumeByFilling({ flow: flow.entered, duration: duration.entered, errorPercent }),
      'duration',
    )
  }
  return tracerOutcome(given)
}

/** A determination of the engines, with its error as the range. */
function determined(found: Result<VolumeDetermination>, field: string): Result<Outcome> {
  if (!found.ok) return { ok: false, refusal: ofTank(found.refusal, field) }
  const { netLitres, errorLitres, working } = found.value
  return ok({
    figures: [{ key: 'net', value: netLitres, unit: 'L', kind: 'volume' }],
    working,
    ...(errorLitres > 0 ? { range: { low: netLitres - errorLitres, high: netLitres + errorLitres } } : {}),
  })
}

/** What is refused about the volume is said of the input that made it. */
const ofTank = (refusal: Refusal, field: string): Refusal =>
  refusal.field === 'netVolume' ? { code: 'volume-not-of-a-tank', field } : refusal

function cautionsOf({ method }: Given, { range, figures }: Outcome): BenchCaution[] {
  const [net] = figures
  const wide =
    range !== undefined && Math.max(range.high / net.value - 1, 1 - range.low / net.value) * 100 > widePercent
  const ways = {
    meter: ['whole-fill'],
    'flow-time': ['flow-falls'],
    salt: ['mixed', 'salt-treats'],
    dye: ['mixed', 'taken-up'],
  } as const
  return [
    ...ways[method].map((code): BenchCaution => ({ code, level: 'warning' })),
    ...(range === undefined ? [{ code: 'error-not-stated', level: 'warning' } as const] : []),
    ...(wide ? [{ code: 'wide', level: 'warning', params: { percent: widePercent } } as const] : []),
  ]
}

/** The sheet of the determination; an error that nobody stated is zero, and so is one that says nothing of the volume. */
function sheetOf(given: Given): VolumeSheet {
  const { method, startReading, endReading } = given
  const errorPercent = given.error?.value ?? 0
  const nothing = { value: '', unit: 'L' } as const
  if (method === 'meter')
    return {
      method: 'metered',
      startReading: startReading?.entered ?? nothing,
      endReading: endReading?.entered ?? nothing,
      errorPercent,
    }
  const outcome = answerTo(given)
  if (!outcome.ok) return { method: 'stated', volume: nothing, errorPercent }
  const [{ value: litres }] = outcome.value.figures
  const { low, high } = outcome.value.range ?? { low: litres, high: litres }
  const widest = Math.max(high / litres - 1, 1 - low / litres) * 100
  const stated = widest > 100 ? 0 : widest
  const tracer = method === 'salt' ? tracerOf(given) : undefined
  if (tracer?.ok) {
    const rise = tracer.value.found.riseMgPerL
    return {
      method: 'salt-dilution',
      saltMass: quantityOf(tracer.value.addedMg, 'mg'),
      salinityRise: quantityOf(rise, 'mg/L'),
      errorPercent: stated,
    }
  }
  return { method: 'stated', volume: quantityOf(litres, 'L'), errorPercent: stated }
}
