import type { BodyOf } from '../../../shared/contracts/contract.ts'
import type * as contracts from '../../../shared/contracts/quarantine.contract.ts'
import { quarantineKindWords } from '../../../shared/messages/quarantine.ts'
import { quarantineRefusals } from '../../../shared/messages/quarantine-refusals.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import { Problem } from '../../platform/http/problem.ts'
import { refusedInput } from '../../platform/http/refused-input.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { AnimalFacts } from '../animals/index.ts'
import { stampsOf } from './case-writer.ts'
import type { CaseWriter, CaseWriterParts } from './case-writer.ts'
import type { CaseRow } from './case.entity.ts'
import * as repository from './cases.repository.ts'
import { findProtocolVersion } from './protocols.repository.ts'
import type { UnnamedBodies } from './unnamed-bodies.ts'

type OpenGiven = BodyOf<typeof contracts.openCase>
type MemberGiven = OpenGiven['members'][number]

interface Joining extends MemberGiven {
  animal: AnimalFacts
  at: string
}

/** Opening a case, letting animals join its batch, and closing it. */
export function createCasesService(
  parts: CaseWriterParts & { transactions: Transactions; writer: CaseWriter; unnamed: UnnamedBodies },
) {
  const { animals, facility, writer } = parts

  const field = (code: Problem['code'], pointer: string, detail: string) =>
    new Problem(code, { detail, errors: [{ pointer, detail, code }] })

  /** The animal behind a number, and when it came in: the beginning of the stay it is in unless told. */
  async function joining(tx: Tx, given: MemberGiven, pointer: string): Promise<Joining> {
    const asked = given.happenedAt === undefined ? tx.at : new Date(given.happenedAt)
    const animal = await animals.questions.animalByAccession(given.accession, asked, tx.manager)
    if (!animal) throw refusedInput(pointer, quarantineRefusals.noSuchAnimal(given), 'not-found')
    const stays = await animals.questions.staysOf([animal.animalId], tx.manager)
    const stay = stays.find(
      ({ from, until }) => new Date(from) <= asked && (until === null || asked < new Date(until)),
    )
    if (!stay) throw field('not-here-then', pointer, quarantineRefusals.notInTheHouse(given))
    return { ...given, animal, at: given.happenedAt ?? stay.from }
  }

  async function join(tx: Tx, head: Pick<CaseRow, 'id' | 'number'>, one: Joining, pointer: string) {
    const times = await writer.timesOf(tx, { happenedAt: one.at }, pointer)
    const { created } = await repository.insertMember(tx, {
      id: one.id,
      caseId: head.id,
      animalId: one.animal.animalId,
      ...stampsOf(times),
    })
    if (!created) return
    tx.audit({
      action: 'case.join',
      subject: { kind: 'case', id: head.id, label: head.number },
      after: { accession: one.accession, joinedAt: times.happenedAt.toISOString() },
    })
  }

  /** A batch is of one kind, and an animal in one running case. */
  async function checkMayJoin(
    tx: Tx,
    one: Joining,
    kind: string,
    caseId: string,
    pointer: string,
  ): Promise<void> {
    const { animal, accession } = one
    const running = await repository.findCaseOf(tx, animal.animalId, tx.at)
    if (running && running.id !== caseId)
      throw field(
        'already-in-a-case',
        pointer,
        quarantineRefusals.alreadyInCase({ accession, number: running.number }),
      )
    if (animal.quarantineKind !== kind)
      throw field(
        'kinds-differ',
        pointer,
        quarantineRefusals.kindsDiffer({
          accession,
          kind: quarantineKindWords[animal.quarantineKind],
          others: quarantineKindWords[kind as keyof typeof quarantineKindWords],
        }),
      )
  }

  return {
    /** Opens a case for animals that are here already; further ones join until it is closed. */
    async openCase(context: RequestContext, given: OpenGiven): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const batch: Joining[] = []
        for (const [i, member] of given.members.entries())
          batch.push(await joining(tx, member, `/members/${String(i)}/accession`))
        const kind = batch[0]?.animal.quarantineKind ?? 'fish'
        const times = await writer.timesOf(tx, given)
        await repository.lockAnimals(
          tx,
          batch.map(({ animal }) => animal.animalId),
        )
        const earlier = await repository.findCase(tx, given.id)
        const version = await findProtocolVersion(tx, given.protocolVersionId)
        if (!version) throw refusedInput('/protocolVersionId', quarantineRefusals.noSuchProtocol, 'not-found')
        for (const [i, one] of batch.entries())
          await checkMayJoin(tx, one, kind, given.id, `/members/${String(i)}/accession`)
        const head: CaseRow = {
          id: given.id,
          number: earlier?.number ?? (await facility.nextNumber(tx, 'case')),
          name: given.name ?? batch[0]?.animal.commonName ?? '',
          quarantineKind: kind,
          protocolVersionId: given.protocolVersionId,
          version: 1,
          ...stampsOf(times),
        }
        const { created } = await repository.insertCase(tx, head)
        for (const [i, one] of batch.entries()) await join(tx, head, one, `/members/${String(i)}/happenedAt`)
        if (created)
          tx.audit({
            action: 'case.open',
            subject: { kind: 'case', id: head.id, label: head.number },
            after: {
              name: head.name,
              quarantineKind: kind,
              protocol: version.name,
              members: batch.map(({ accession }) => accession),
            },
          })
        await parts.unnamed.catchUp(tx, head)
        await writer.settle(tx, head.id)
      })
    },

    /** Another animal or group of the batch. After closing it is an addition and restarts the clock. */
    async addMember(context: RequestContext, number: string, given: MemberGiven): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const one = await joining(tx, given, '/accession')
        const locked = await writer.lock(tx, number, [one.animal.animalId])
        const { head } = locked
        if (!(await repository.findMember(tx, given.id))) {
          writer.checkRuns(locked, new Date(one.at))
          await checkMayJoin(tx, one, head.quarantine_kind, head.id, '/accession')
        }
        await join(tx, head, one, '/happenedAt')
        await parts.unnamed.catchUp(tx, head)
        await writer.settle(tx, head.id)
      })
    },

    /** The last of the batch is in. */
    async closeCase(
      context: RequestContext,
      number: string,
      given: { id: string; happenedAt: string },
    ): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const locked = await writer.lock(tx, number)
        const { head, facts } = locked
        const times = await writer.timesOf(tx, given)
        const closed = facts.events.find(
          (row) => row.case_id === head.id && row.kind === 'closed' && row.voided_reason === null,
        )
        if (closed && closed.id !== given.id)
          throw new Problem('already-closed', { detail: quarantineRefusals.alreadyClosed({ number }) })
        await writer.write(tx, head, { id: given.id, facts: { kind: 'closed' } }, times)
        await writer.settle(tx, head.id)
      })
    },
  }
}

export type CasesService = ReturnType<typeof createCasesService>
