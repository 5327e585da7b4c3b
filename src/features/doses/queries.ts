import { queryOptions } from '@tanstack/react-query'
import { getBathSheet, printBathSheet } from '../../../shared/contracts/doses.contract.ts'
import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import { addressOf, api } from '../../lib/api-client.ts'
import { keep, readKept } from '../../lib/kept.ts'

export const dosesKey = ['doses'] as const

/**
 * One planned dose, judged now. The blind sheet is kept apart from the whole one: whoever calculates a second time has
 * only the blind one on their device.
 *
 * @param lotId the lot in the hand, where somebody chose one: it is judged by that
 */
export const sheetQuery = (number: string, key: string, blind: boolean, lotId: string | null = null) =>
  queryOptions({
    queryKey: [...dosesKey, number, key, blind ? 'blind' : 'whole', ...(lotId === null ? [] : [lotId])],
    queryFn: ({ signal }) =>
      api(getBathSheet, {
        params: { number, key },
        query: { ...(blind ? { blind: 'yes' as const } : {}), ...(lotId === null ? {} : { lot: lotId }) },
        signal,
      }),
    staleTime: 0,
  })

// a sheet that was kept by a page from before `running` was told is not read
const runningKey = (number: string, key: string) => `running baths ${number} ${key}`

/**
 * A bath that runs is kept on the device: it is timed and stopped without a signal too.
 *
 * @param receivedMs when the server sent it, by the device's clock: the time of the bath is told by that
 */
export async function keepRunning(sheet: BathSheet, receivedMs: number): Promise<void> {
  await keep(runningKey(sheet.number, sheet.key), sheet, new Date(receivedMs))
}

/** The running bath as it was when the server last answered; null where none was kept. */
export const keptRunningQuery = (number: string, key: string) =>
  queryOptions({
    queryKey: [...dosesKey, number, key, 'kept'],
    queryFn: () => readKept<BathSheet>(runningKey(number, key)),
    networkMode: 'always',
    staleTime: 0,
  })

/** The bath sheet of a dose on paper. */
export const sheetPrintAddress = (number: string, key: string): string =>
  addressOf(printBathSheet, { number, key })
