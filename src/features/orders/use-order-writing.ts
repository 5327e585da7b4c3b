import { useState } from 'react'
import { useQueryClient } from '@tanstack/react-query'
import type { AnsweredCaution, Order } from '../../../shared/contracts/orders.contract.ts'
import type { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import { newId } from '../../lib/new-id.ts'
import { isProblem } from '../../lib/problem-error.ts'
import type { ProblemError } from '../../lib/problem-error.ts'
import { useDraftOrder, useReviseDraft, useSignOrder } from './mutations.ts'
import { orderQuery, previewsKey } from './queries.ts'

interface Kept {
  number: string
  version: number
  /** What was kept last, as text: what differs from it is unsaved. */
  text: string
  /** There is a draft to sign; a signed order that nobody amended yet has none. */
  isDraft: boolean
}

export interface SignRequest {
  password: string
  licenceId: string | undefined
  relationship?: true
  read: AnsweredCaution[]
  overrides: (AnsweredCaution & { reason: string })[]
}

/**
 * Keeping and signing an order that is being written. A draft is kept by its version: when somebody else has saved it
 * meanwhile, both texts are held and the person chooses. Nothing typed is ever thrown away by a refusal.
 */
export function useOrderWriting(opened: Order | null, openedFields: BathOrderFields | null) {
  const client = useQueryClient()
  const draft = useDraftOrder()
  const revise = useReviseDraft()
  const sign = useSignOrder()
  const [id] = useState(newId)
  const [signKey, setSignKey] = useState(newId)
  const [kept, setKept] = useState<Kept | null>(
    opened && {
      number: opened.number,
      version: opened.version,
      text: JSON.stringify(openedFields),
      isDraft: opened.draft !== null,
    },
  )
  const [problem, setProblem] = useState<ProblemError | null>(null)
  const [refusedAt, setRefusedAt] = useState<'keep' | 'sign' | null>(null)
  const [theirs, setTheirs] = useState<Order | null>(null)
  const [busy, setBusy] = useState<'keep' | 'sign' | null>(null)

  /** The order as it stands now at the server, beside what was typed. */
  const askTheirs = async (number: string) => {
    await client.invalidateQueries({ queryKey: orderQuery(number).queryKey })
    setTheirs(await client.fetchQuery({ ...orderQuery(number), staleTime: 0 }))
  }

  const refused = async (error: unknown, at: 'keep' | 'sign'): Promise<null> => {
    if (!isProblem(error)) throw error
    setProblem(error)
    setRefusedAt(at)
    // what was answered is judged anew, so that what stands now is there to be read
    if (isProblem(error, 'caution-not-fired', 'caution-stops', 'cautions-unread'))
      await client.invalidateQueries({ queryKey: previewsKey })
    if (kept && isProblem(error, 'stale-version', 'nothing-to-sign', 'order-ended'))
      await askTheirs(kept.number)
    return null
  }

  const save = async (fields: BathOrderFields, over?: Kept): Promise<Order> => {
    const base = over ?? kept
    const order = base
      ? await revise.mutateAsync({ number: base.number, expectedVersion: base.version, fields })
      : await draft.mutateAsync({ id, fields })
    setKept({ number: order.number, version: order.version, text: JSON.stringify(fields), isDraft: true })
    setTheirs(null)
    return order
  }

  return {
    kept,
    problem,
    /** Which act was refused last: that is where it is said. */
    refusedAt: problem === null ? null : refusedAt,
    theirs,
    busy,
    /** Keeps the draft; null when it was refused. */
    async keep(fields: BathOrderFields): Promise<Order | null> {
      setBusy('keep')
      setProblem(null)
      try {
        return await save(fields)
      } catch (error) {
        return await refused(error, 'keep')
      } finally {
        setBusy(null)
      }
    },
    /** Saves what was typed over what the other person saved. */
    async keepOver(fields: BathOrderFields): Promise<Order | null> {
      if (!theirs) return null
      setBusy('keep')
      setProblem(null)
      try {
        return await save(fields, { number: theirs.number, version: theirs.version, text: '', isDraft: true })
      } catch (error) {
        return await refused(error, 'keep')
      } finally {
        setBusy(null)
      }
    },
    /** Goes on from what the other person saved. */
    takeTheirs(fields: BathOrderFields): void {
      if (!theirs) return
      setKept({ number: theirs.number, version: theirs.version, text: JSON.stringify(fields), isDraft: true })
      setTheirs(null)
      setProblem(null)
    },
    /** Keeps what is unsaved, then signs it; null when either was refused. */
    async signNow(fields: BathOrderFields, request: SignRequest): Promise<Order | null> {
      setBusy('sign')
      setProblem(null)
      try {
        const saved = kept?.isDraft && kept.text === JSON.stringify(fields) ? kept : await save(fields)
        const { number, version } = saved
        const signed = await sign.mutateAsync({ number, key: signKey, expectedVersion: version, ...request })
        setSignKey(newId())
        return signed
      } catch (error) {
        // an attempt that was answered is over; one without an answer is repeated under its own key
        if (isProblem(error) && !error.noAnswer) setSignKey(newId())
        return await refused(error, 'sign')
      } finally {
        setBusy(null)
      }
    },
  }
}

export type OrderWriting = ReturnType<typeof useOrderWriting>
