import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { evaluate } from '../../../shared/bench/evaluate.ts'
import { verifyWorking } from '../../../server/platform/arithmetic/verify-working.ts'
import { bodyOf } from './ask.ts'

const runs = { numRuns: 60 }
const hundredths = (least: number, most: number) =>
  fc
    .integer({ min: Math.round(least * 100), max: Math.round(most * 100) })
    .map((value) => (value / 100).toFixed(2))
const degrees = (least: number, most: number) =>
  fc.oneof(
    hundredths(least, most).map((text) => `${text} degC`),
    hundredths(least * 1.8 + 32.01, most * 1.8 + 31.99).map((text) => `${text} degF`),
  )
/** Salinities as they are typed; those from 0.99 to 1.05 are taken for specific gravities. */
const salinities = (least: number, most: number) =>
  hundredths(least, most)
    .filter((text) => Number(text) < 0.99 || Number(text) > 1.05)
    .map((text) => `${text} PSS-78`)
const pressures = fc.oneof(
  hundredths(700, 1100).map((text) => `${text} hPa`),
  hundredths(525, 825).map((text) => `${text} mmHg`),
  hundredths(21, 32).map((text) => `${text} inHg`),
  hundredths(70, 110).map((text) => `${text} kPa`),
  hundredths(0.7, 1.08).map((text) => `${text} atm`),
)
const reports = fc.oneof(
  hundredths(900, 1080).map((text) => `${text} hPa`),
  hundredths(27, 31.5).map((text) => `${text} inHg`),
)
const heights = fc.oneof(
  hundredths(-300, 3500).map((text) => `${text} m`),
  hundredths(-900, 11_000).map((text) => `${text} ft`),
)

const air = fc.oneof(
  fc.record({ pressureBy: fc.constant('station'), pressure: pressures, stationAltitude: heights }),
  fc.record({ pressureBy: fc.constant('sea-level'), seaLevel: reports, altitude: heights }),
  fc.record({ pressureBy: fc.constant('altitude'), altitude: heights }),
  fc.record({ pressureBy: fc.constant('standard') }),
)
const oxygen = fc.oneof(
  fc.record({
    find: fc.constant('percent'),
    oxygen: fc.oneof(
      hundredths(0, 20).map((text) => `${text} mg/L`),
      hundredths(0, 14).map((text) => `${text} mL/L`),
    ),
  }),
  fc.record({
    find: fc.constant('concentration'),
    percent: hundredths(0, 200).map((text) => `${text} percent`),
  }),
  fc.record({ find: fc.constant('saturation') }),
)
const meters = fc.oneof(
  fc.record({
    measured: fc.constantFrom('uncompensated', 'compensated-25', 'compensated-20'),
    conductivity: fc.oneof(
      hundredths(0.01, 60).map((text) => `${text} mS/cm`),
      hundredths(5, 60_000).map((text) => `${text} uS/cm`),
    ),
    temperature: degrees(-2, 40),
  }),
  fc.record({
    measured: fc.constant('ratio'),
    ratio: hundredths(0.01, 1.6).map((text) => `${text} ratio`),
    temperature: degrees(-2, 40),
  }),
)

const questions: Record<string, fc.Arbitrary<Record<string, string>>> = {
  'oxygen-saturation': fc
    .tuple(oxygen, air, degrees(0, 40), salinities(0, 40))
    .map(([asked, above, temperature, salinity]) => ({ ...asked, ...above, temperature, salinity })),
  'barometric-pressure': fc.oneof(
    fc.record({ find: fc.constant('standard'), altitude: heights }),
    fc.record({ find: fc.constant('station'), seaLevel: reports, altitude: heights }),
    fc.record({ find: fc.constant('sea-level'), station: pressures, altitude: heights }),
  ),
  'salinity-from-conductivity': meters,
  'conductivity-from-salinity': fc.record({ salinity: salinities(0.05, 42), temperature: degrees(-2, 40) }),
  'seawater-density': fc.record({
    salinity: salinities(0, 42),
    temperature: degrees(-2, 40),
    volume: fc.constantFrom('1000 L', '2.5 m3', '300 gal_us', '80 gal_imp', '12 ft3'),
  }),
  'freezing-point': fc.record({ salinity: salinities(4, 40), coldest: degrees(-5, 5) }),
}

describe('the working of whatever is asked of sea water and its gases', () => {
  it.each(Object.keys(questions))('%s is borne out by mathjs', async (id) => {
    const of = calculatorAt(id)
    const asked = questions[id]
    if (!of || !asked) throw new Error(id)
    let answered = 0
    await fc.assert(
      fc.asyncProperty(asked, async (given) => {
        const evaluation = evaluate(of, bodyOf(given))
        if (!evaluation.ok) return
        answered += 1
        expect(await verifyWorking(evaluation.answer.working)).toEqual({ ok: true })
        const [result] = evaluation.answer.figures
        expect(evaluation.answer.working.some((line) => line.value === result.value)).toBe(true)
      }),
      runs,
    )
    // a law that is hardly ever reached holds of nothing
    expect(answered).toBeGreaterThan(runs.numRuns / 3)
  })
})
