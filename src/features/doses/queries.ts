import { queryOptions } from '@tanstack/react-query'
import { getBathSheet, printBathSheet } from '../../../shared/contracts/doses.contract.ts'
import { addressOf, api } from '../../lib/api-client.ts'

export const dosesKey = ['doses'] as const

/**
 * One planned dose, judged now. The blind sheet is kept apart from the whole one: whoever calculates a second time has
 * only the blind one on their device.
 */
export const sheetQuery = (number: string, key: string, blind: boolean) =>
  queryOptions({
    queryKey: [...dosesKey, number, key, blind ? 'blind' : 'whole'],
    queryFn: ({ signal }) =>
      api(getBathSheet, { params: { number, key }, query: blind ? { blind: 'yes' as const } : {}, signal }),
    staleTime: 0,
  })

/** The bath sheet of a dose on paper. */
export const sheetPrintAddress = (number: string, key: string): string =>
  addressOf(printBathSheet, { number, key })
