import { successStatus } from '../../../shared/contracts/contract.ts'
import { allContracts } from '../../../shared/contracts/index.ts'

/** Every address of the API as a table to read; made from the contracts, like `/api/openapi.json`. */
export function apiDocument(): string {
  const rows = [...allContracts]
    .sort((a, b) => a.path.localeCompare(b.path) || a.method.localeCompare(b.method))
    .map((of) => {
      const address = `\`${of.method.toUpperCase()} /api${of.path}\``
      const once = of.idempotent === 'by-key' ? 'key' : of.idempotent === 'by-record-id' ? 'record id' : ''
      return `| ${address} | ${of.summary} | ${of.action} | ${String(successStatus(of))} ${of.produces ?? ''} | ${once} |`
    })
  return [
    '# The API',
    '',
    'Made from `shared/contracts` by a test. Schemas and problems of each address: `GET /api/openapi.json`, signed in. The',
    'last column says how a retry is recognised: by the new record’s own id in the body, or by an Idempotency-Key header.',
    '',
    '| address | does | action | success | retry |',
    '| --- | --- | --- | --- | --- |',
    ...rows,
    '',
  ].join('\n')
}
