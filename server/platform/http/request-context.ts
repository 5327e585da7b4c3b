import type { Role } from '../../../shared/domain/permissions/roles.ts'

/** Who does it: a signed-in person, or the installation itself (seed, job). */
export interface Actor {
  /** null: the installation itself */
  personId: string | null
  printedName: string
  roles: readonly Role[]
}

/** A command sent with an Idempotency-Key: done once, answered as often as it is sent. */
export interface Command {
  key: string
  contractId: string
  bodyHash: string
}

/** A record sent under its own id: written once, and never again with other content. */
export interface RecordRequest {
  id: string
  contractId: string
  contentHash: string
}

/** What a service needs to know about the call it serves. */
export interface RequestContext {
  actor: Actor
  requestId: string
  command?: Command
  record?: RecordRequest
}

/** The installation itself, for work that no person asked for. */
export const installation: Actor = { personId: null, printedName: 'Pratique', roles: [] }
