import { queryOptions } from '@tanstack/react-query'
import { getNotice, getOnCall } from '../../../shared/contracts/notices.contract.ts'
import { getRound } from '../../../shared/contracts/observations.contract.ts'
import { api } from '../../lib/api-client.ts'
import { readOrKept } from '../../lib/kept.ts'

/** The round, kept on the device: at a tank without a signal it is as of the last time there was one. */
export const roundQuery = queryOptions({
  queryKey: ['quarantine', 'round'],
  queryFn: ({ signal }) => readOrKept('round', () => api(getRound, { signal })),
  networkMode: 'always',
  retry: false,
})

/** Whom to telephone, kept on the device. */
export const onCallQuery = queryOptions({
  queryKey: ['quarantine', 'on-call'],
  queryFn: ({ signal }) => readOrKept('on-call', () => api(getOnCall, { signal })),
  networkMode: 'always',
  retry: false,
})

const askEveryMs = 3_000

/** The fate of an urgent call, asked for again until somebody has seen it. */
export const noticeQuery = (id: string) =>
  queryOptions({
    queryKey: ['quarantine', 'notice', id],
    queryFn: ({ signal }) => api(getNotice, { params: { id }, signal }),
    networkMode: 'always',
    retry: false,
    refetchInterval: ({ state }) => (state.data?.state === 'seen' ? false : askEveryMs),
  })
