import { useState } from 'react'
import { useLocation } from 'react-router-dom'
import { z } from 'zod'
import { BenchAsked } from '../../shared/contracts/order-primitives.ts'
import { EnteredQuantity } from '../../shared/contracts/primitives.ts'
import { VolumeSheetBody } from '../../shared/contracts/volume-sheet.ts'
import { readingParameters } from '../../shared/domain/readings/parameters.ts'
import { concentrationBases } from '../../shared/domain/units/basis.ts'
import { benchCarryWords as words } from '../../shared/messages/bench-carry.ts'

/** What was asked on the bench and what came out, in words. */
const Said = z.strictObject({
  name: z.string(),
  result: z.string(),
  inputs: z.array(z.string()),
  working: z.array(z.string()),
})
export type BenchSaid = z.infer<typeof Said>

const Carried = z.discriminatedUnion('to', [
  z.strictObject({
    to: z.literal('order'),
    said: Said,
    bench: BenchAsked.nullable(),
    enclosureId: z.string().nullable(),
    target: EnteredQuantity.nullable(),
    basis: z.enum(concentrationBases).nullable(),
    division: EnteredQuantity.nullable(),
  }),
  z.strictObject({ to: z.literal('volume'), said: Said, sheet: VolumeSheetBody }),
  z.strictObject({
    to: z.literal('reading'),
    said: Said,
    parameter: z.enum(readingParameters),
    value: EnteredQuantity,
  }),
])
/** A result of the bench on its way into a form: it lies in the history of the window, beside the address. */
export type BenchCarry = z.infer<typeof Carried>
export type CarryTo<T extends BenchCarry['to']> = Extract<BenchCarry, { to: T }>

/** The state of a history entry that carries something. */
export const carryState = (carried: BenchCarry) => ({ bench: carried })

/** What was carried to this form as it was opened; null when nothing was, or something that it does not understand. */
export function useCarried<T extends BenchCarry['to']>(to: T): CarryTo<T> | null {
  const { state } = useLocation()
  const [carried] = useState(() => readCarried(to, state))
  return carried
}

/** See useCarried. */
export function readCarried<T extends BenchCarry['to']>(to: T, state: unknown): CarryTo<T> | null {
  const read = Carried.safeParse((state as { bench?: unknown } | null)?.bench)
  return read.success && read.data.to === to ? (read.data as CarryTo<T>) : null
}

const longestNote = 2000

/** The line that names the calculator and its result. */
export const saidHead = ({ name, result }: BenchSaid) => words.from({ name, result })

/** The whole of it as a note of a record that has no working of its own. */
export function saidNote(said: BenchSaid): string {
  const asked = words.askedNote({ inputs: said.inputs.join('; ') })
  const short = `${saidHead(said)} ${asked}`
  const whole = `${short} ${words.workingNote({ lines: said.working.join('; ') })}`
  if (whole.length <= longestNote) return whole
  const cut = `${short} ${words.noteTooLong}`
  return cut.length <= longestNote ? cut : `${saidHead(said)} ${words.noteTooLong}`.slice(0, longestNote)
}
