import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import * as contracts from '../../../shared/contracts/people.contract.ts'
import { api } from '../../lib/api-client.ts'
import { meKey } from '../../lib/query-client.ts'
import { peopleKey } from './queries.ts'

/** Whatever changes about a person refreshes all lists of people, and who is signed in: it may be oneself. */
function useRefresh() {
  const client = useQueryClient()
  return async () => {
    await client.invalidateQueries({ queryKey: peopleKey })
    await client.invalidateQueries({ queryKey: meKey })
  }
}

export function useEnterPerson() {
  const onSuccess = useRefresh()
  return useMutation({
    mutationFn: (body: BodyOf<typeof contracts.enterPerson>) => api(contracts.enterPerson, { body }),
    onSuccess,
  })
}

export function useCorrectPerson(id: string) {
  const onSuccess = useRefresh()
  return useMutation({
    mutationFn: (body: BodyOf<typeof contracts.correctPerson>) =>
      api(contracts.correctPerson, { params: { id }, body }),
    onSuccess,
  })
}

export function useIssueOneTimePassword(id: string) {
  const onSuccess = useRefresh()
  return useMutation({
    mutationFn: (key: string) => api(contracts.issueOneTimePassword, { params: { id }, key }),
    onSuccess,
  })
}

export function useEnterLicence(id: string) {
  const onSuccess = useRefresh()
  return useMutation({
    mutationFn: (body: BodyOf<typeof contracts.enterLicence>) =>
      api(contracts.enterLicence, { params: { id }, body }),
    onSuccess,
  })
}

export function useCorrectLicence(id: string, licenceId: string) {
  const onSuccess = useRefresh()
  return useMutation({
    mutationFn: (body: BodyOf<typeof contracts.correctLicence>) =>
      api(contracts.correctLicence, { params: { id, licenceId }, body }),
    onSuccess,
  })
}

export function useEndLicence(id: string) {
  const onSuccess = useRefresh()
  return useMutation({
    mutationFn: (given: { licenceId: string; body: BodyOf<typeof contracts.endLicence>; key: string }) =>
      api(contracts.endLicence, {
        params: { id, licenceId: given.licenceId },
        body: given.body,
        key: given.key,
      }),
    onSuccess,
  })
}

export function useVoidLicence(id: string) {
  const onSuccess = useRefresh()
  return useMutation({
    mutationFn: ({ licenceId, reason, key }: { licenceId: string; reason: string; key: string }) =>
      api(contracts.voidLicence, { params: { id, licenceId }, body: { reason }, key }),
    onSuccess,
  })
}
