import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import { unitTable } from '../../../shared/domain/units/unit-table.ts'

const values: readonly unknown[] = [
  '0',
  '-0',
  '-1',
  '1',
  '0.1',
  '1.5',
  '7',
  '25',
  '35',
  '100',
  '1000',
  '1e3',
  '1e308',
  '1'.repeat(39),
  '9'.repeat(40),
  `0.${'0'.repeat(30)}1`,
  '11,400',
  '1,5',
  '1.2.3',
  '',
  '   ',
  'NaN',
  'Infinity',
  '-Infinity',
  'ten',
  '٣',
  '0x10',
  '--1',
  '1 000',
  NaN,
  Infinity,
  -Infinity,
  0,
  -0,
  -1,
  1e308,
  1e-308,
  5e-324,
  42,
  0.1 + 0.2,
  null,
  undefined,
  true,
  false,
  [],
  {},
  [1],
  { value: 1 },
  '%',
  '<b>',
]
const units: readonly unknown[] = [
  ...Object.keys(unitTable),
  'ppm',
  'gal',
  'gallon',
  '%',
  'ppt',
  'cc',
  'IU',
  '',
  ' ',
  'constructor',
  '__proto__',
  null,
  undefined,
  7,
  {},
  [],
]
const wholes: readonly unknown[] = [null, undefined, 7, NaN, 'text', [], {}, true, { constructor: 1 }, [[]]]

/** A small generator with a fixed seed, so that a failure can be seen again. */
function chance(seed: number): () => number {
  let state = seed
  return () => {
    state = (state * 1_664_525 + 1_013_904_223) % 4_294_967_296
    return state / 4_294_967_296
  }
}

/**
 * Bodies that nobody means: the calculator's own example with some inputs spoiled. Half of them keep most of the example
 * whole and move single figures over many powers of ten, so that the arithmetic is reached and not only the reader.
 */
export function* hostileBodies(of: AnyCalculator, count: number): Generator<unknown> {
  const next = chance(20_261_203)
  const pick = <T>(from: readonly T[]): T => from[Math.floor(next() * from.length)] as T
  const names = Object.keys(of.inputs)
  for (let i = 0; i < count; i += 1) {
    if (i < wholes.length) {
      yield wholes[i]
      continue
    }
    const body: Record<string, unknown> = { ...of.example }
    const gentle = next() < 0.5
    for (const name of names) {
      if (next() < (gentle ? 0.6 : 0.5)) continue
      const input = of.inputs[name]
      if (input?.kind === 'choice') body[name] = gentle || next() < 0.7 ? pick(input.options) : pick(values)
      else if (input)
        body[name] = gentle
          ? { value: pick([1, -1, 1, 1]) * 10 ** (next() * 16 - 8), unit: pick(input.units) }
          : next() < 0.2
            ? pick([...values, ...wholes])
            : { value: pick(values), unit: next() < 0.5 ? pick(input.units) : pick(units) }
    }
    if (next() < 0.05) body[pick(['x', '__proto__', 'constructor', 'toString'])] = pick(values)
    if (next() < 0.1) delete body[pick(names)]
    yield body
  }
}
