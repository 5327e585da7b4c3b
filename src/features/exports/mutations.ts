import { useMutation, useQueryClient } from '@tanstack/react-query'
import { exportHistory } from '../../../shared/contracts/exports.contract.ts'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import { api } from '../../lib/api-client.ts'
import { exportsKey } from './queries.ts'

/** Makes the file of a history; it is kept, with who took it out and for what. */
export function useExportHistory(accession: string) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (body: BodyOf<typeof exportHistory>) =>
      api(exportHistory, { params: { accession }, body, patienceMs: 60_000 }),
    onSuccess: () => client.invalidateQueries({ queryKey: exportsKey }),
  })
}
