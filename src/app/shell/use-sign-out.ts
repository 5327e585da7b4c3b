import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useNavigate } from 'react-router-dom'
import { signInAddresses } from '../../../shared/contracts/sign-in.addresses.ts'
import type { signOut } from '../../../shared/contracts/sign-in.contract.ts'
import { api } from '../../lib/api-client.ts'
import { paths } from '../../lib/paths.ts'
import { changePerson } from '../../lib/me.ts'

/** Ends the session and forgets everything that was read under it. */
export function useSignOut() {
  const client = useQueryClient()
  const navigate = useNavigate()
  return useMutation({
    mutationFn: () => api<typeof signOut>(signInAddresses.signOut, {}),
    onSuccess: async () => {
      changePerson(client, null)
      await navigate(paths.signIn(), { replace: true })
    },
  })
}
