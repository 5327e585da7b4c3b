import { useMutation, useQueryClient } from '@tanstack/react-query'
import { signInAddresses } from '../../shared/contracts/sign-in.addresses.ts'
import type { Me, preferenceNames, setPreference } from '../../shared/contracts/sign-in.contract.ts'
import { api } from './api-client.ts'
import { useMe } from './me.ts'
import { meKey } from './query-client.ts'

export type PreferenceName = (typeof preferenceNames)[number]

/** A choice of the signed-in person; undefined while they have made none. */
export function usePreference(name: PreferenceName): string | undefined {
  return useMe().preferences[name]
}

/** Keeps a choice of the signed-in person. It shows at once; a refusal puts the earlier one back. */
export function useSetPreference() {
  const client = useQueryClient()
  return useMutation({
    mutationFn: ({ name, value }: { name: PreferenceName; value: string }) =>
      api<typeof setPreference>(signInAddresses.setPreference, { params: { name }, body: { value } }),
    onMutate: ({ name, value }) => {
      const before = client.getQueryData<Me | null>(meKey)
      if (before)
        client.setQueryData(meKey, { ...before, preferences: { ...before.preferences, [name]: value } })
      return { before }
    },
    onError: (_error, _choice, context) => {
      // the session may have ended with this very call; then there is nobody to put the choice back for
      if (context?.before && client.getQueryData(meKey)) client.setQueryData(meKey, context.before)
    },
    onSuccess: (me) => client.setQueryData(meKey, me),
  })
}

/** Whether single-letter keys act for this person; they do until turned off. */
export function useSingleKeys(): boolean {
  return usePreference('singleKeys') !== 'off'
}
