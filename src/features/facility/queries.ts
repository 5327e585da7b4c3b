import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import { confirmSetting, listSettings, proposeSetting } from '../../../shared/contracts/facility.contract.ts'
import { api } from '../../lib/api-client.ts'
import { meKey } from '../../lib/query-client.ts'

const facilityKey = ['facility'] as const

export const settingsQuery = queryOptions({
  queryKey: [...facilityKey, 'settings'],
  queryFn: async ({ signal }) => (await api(listSettings, { signal })).settings,
})

/** The facility's name, zone and gallon stand in what the client knows of the signed-in person as well. */
function useRefresh() {
  const client = useQueryClient()
  return async () => {
    await client.invalidateQueries({ queryKey: facilityKey })
    await client.invalidateQueries({ queryKey: meKey })
  }
}

export function useProposeSetting(key: string) {
  const onSuccess = useRefresh()
  return useMutation({
    mutationFn: (body: { id: string; value: string }) => api(proposeSetting, { params: { key }, body }),
    onSuccess,
  })
}

export function useConfirmSetting(settingKey: string) {
  const onSuccess = useRefresh()
  return useMutation({
    mutationFn: ({ proposalId, key }: { proposalId: string; key: string }) =>
      api(confirmSetting, { params: { key: settingKey, proposalId }, key }),
    onSuccess,
  })
}
