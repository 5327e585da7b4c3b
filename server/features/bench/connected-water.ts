import type { askConnectedWater } from '../../../shared/contracts/bench-questions.contract.ts'
import type { BodyOf, ReplyOf } from '../../../shared/contracts/contract.ts'
import { listConnectedWaters } from '../../../shared/domain/connections/connected-water.ts'
import { benchQuestionWords } from '../../../shared/messages/bench-questions.ts'
import { refused } from './refused.ts'

/**
 * Every separate water at an instant, from a map and nothing else; volumes added up where all of them are known.
 *
 * @throws Problem not-computable: duplicate-name, unknown-connection-end, unknown-connection
 */
export function answerConnectedWater(
  asked: BodyOf<typeof askConnectedWater>,
): ReplyOf<typeof askConnectedWater> {
  const { at, bodies, connections, ledger } = asked
  refuseTwice(
    bodies.map(({ waterBodyId }) => waterBodyId),
    'bodies',
    'waterBodyId',
  )
  refuseTwice(
    connections.map(({ connectionId }) => connectionId),
    'connections',
    'connectionId',
  )
  const known = new Set(bodies.map(({ waterBodyId }) => waterBodyId))
  for (const [index, connection] of connections.entries())
    for (const end of ['bodyAId', 'bodyBId'] as const)
      if (!known.has(connection[end]))
        throw refused(`/connections/${index}/${end}`, 'unknown-connection-end', benchQuestionWords.unknownEnd)
  const named = new Set(connections.map(({ connectionId }) => connectionId))
  for (const [index, { connectionId }] of ledger.entries())
    if (!named.has(connectionId))
      throw refused(
        `/ledger/${index}/connectionId`,
        'unknown-connection',
        benchQuestionWords.unknownConnection,
      )

  const waters = listConnectedWaters(
    {
      bodies: bodies.map(({ litres: _, ...body }) => ({
        ...body,
        enclosureId: body.kind === 'enclosure' ? body.waterBodyId : null,
      })),
      connections,
      // of two entries at the same instant the one further down the list is taken as written later
      ledger: ledger.map((entry, index) => ({
        ...entry,
        entryId: String(index).padStart(6, '0'),
        recordedAt: entry.recordedAt ?? entry.at,
      })),
    },
    at,
  )
  if (!waters.ok) throw refused('', waters.refusal.code, benchQuestionWords.notUnderstood)
  const litresOf = new Map(bodies.map(({ waterBodyId, litres }) => [waterBodyId, litres]))
  return {
    at,
    waters: waters.value.map(({ waterBodyIds, connections: touching, unknownConnectionIds }) => {
      const litresNotKnownOf = waterBodyIds.filter((id) => litresOf.get(id) === undefined)
      const litres = waterBodyIds.reduce((sum, id) => sum + (litresOf.get(id) ?? 0), 0)
      return {
        waterBodyIds,
        litres: litresNotKnownOf.length === 0 ? litres : null,
        litresNotKnownOf,
        connections: touching,
        unknownConnectionIds,
      }
    }),
  }
}

function refuseTwice(names: readonly string[], list: string, field: string): void {
  const at = names.findIndex((name, index) => names.indexOf(name) !== index)
  if (at >= 0) throw refused(`/${list}/${at}/${field}`, 'duplicate-name', benchQuestionWords.duplicateName)
}
