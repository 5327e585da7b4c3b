import path from 'node:path'
import type { DataSource } from 'typeorm'
import { createAcquisitions } from './features/acquisitions/index.ts'
import { createAdministrations } from './features/administrations/index.ts'
import { createAnimals } from './features/animals/index.ts'
import { createAudit } from './features/audit/index.ts'
import { createEnclosures } from './features/enclosures/index.ts'
import { createBench } from './features/bench/index.ts'
import { createCautions } from './features/cautions/index.ts'
import { createCounterparties } from './features/counterparties/index.ts'
import { createDocuments } from './features/documents/index.ts'
import { createExports } from './features/exports/index.ts'
import { createFacility } from './features/facility/index.ts'
import { createFormulary } from './features/formulary/index.ts'
import { createHandover } from './features/handover/index.ts'
import { createOrders } from './features/orders/index.ts'
import { createPeople } from './features/people/index.ts'
import { createPermits } from './features/permits/index.ts'
import { createQuarantine } from './features/quarantine/index.ts'
import { createSigning } from './features/signing/index.ts'
import { createAuthenticator, createMeReader, signInRoutes } from './features/sign-in/index.ts'
import { createToday } from './features/today/index.ts'
import { createWater } from './features/water/index.ts'
import type { Clock } from './platform/clock.ts'
import { createTransactions } from './platform/database/transactions.ts'
import { createFileStore } from './platform/files/file-store.ts'
import { createIds } from './platform/ids.ts'
import type { Log } from './platform/log.ts'
import { createMail } from './platform/mail/mail.ts'
import { createPdfPool } from './platform/pdf/pdf-pool.ts'
import { createSigner } from './platform/signatures/signer.ts'
import { createLockout } from './platform/sign-in/lockout.ts'

export interface Outside {
  dataSource: DataSource
  clock: Clock
  log: Log
  /** This installation shows the practice scenario. */
  demo: boolean
  /** Folder of keys and attachments; belongs into the backup. */
  dataFolder: string
  /** Mail server; without one letters lie in the data folder where the demo is shown, and cannot be sent elsewhere. */
  smtpUrl?: string | null
  /** Where people reach the application, for letters. */
  publicUrl?: string
}

/** The one place where features are made, in an order in which each asks only those made before it. */
export function compose(outside: Outside) {
  const { dataSource, clock } = outside
  const parts = {
    ...outside,
    ids: createIds(clock),
    transactions: createTransactions({ dataSource, clock }),
    files: createFileStore(path.join(outside.dataFolder, 'files')),
    pdf: createPdfPool(),
    mail: createMail({
      smtpUrl: outside.smtpUrl ?? null,
      folder: outside.demo ? path.join(outside.dataFolder, 'mailbox') : null,
      clock,
    }),
  }
  const facility = createFacility(parts)
  const lockout = createLockout(parts)
  const people = createPeople({ ...parts, facility: facility.service, lockout })
  const authenticator = createAuthenticator(people)
  const readMe = createMeReader({ people, facility: facility.service, demo: outside.demo })
  const signer = createSigner(path.join(outside.dataFolder, 'keys'))
  const signing = createSigning({ ...parts, signer, facility: facility.service, people })
  const cautions = createCautions({ ...parts, facility: facility.service, signing: signing.service })
  const enclosures = createEnclosures(parts)
  const water = createWater({ ...parts, facility: facility.service, enclosures })
  const formulary = createFormulary({ ...parts, facility: facility.service, people })
  const animals = createAnimals({ ...parts, facility: facility.service, water })
  const documents = createDocuments(parts)
  const quarantine = createQuarantine({
    ...parts,
    facility: facility.service,
    people,
    signing: signing.service,
    animals,
    water,
    enclosures,
    documents,
    mail: parts.mail,
    publicUrl: outside.publicUrl ?? '',
  })
  const counterparties = createCounterparties(parts)
  const register = {
    ...parts,
    facility: facility.service,
    counterparties: counterparties.service,
    documents,
    animals,
  }
  const permits = createPermits(register)
  const orders = createOrders({
    ...parts,
    facility: facility.service,
    signing: signing.service,
    formulary,
    cautions,
    water,
    animals,
    documents,
    publicUrl: outside.publicUrl ?? '',
    treatments: quarantine.services.treatments,
  })
  const acquisitions = createAcquisitions({
    ...register,
    permits: permits.service,
    withdrawalHold: orders.withdrawalHold,
  })
  const exports = createExports({ ...register, acquisitions })
  const audit = createAudit({ ...parts, blindAmong: orders.queries.blindAmong })
  const administrations = createAdministrations({
    ...parts,
    facility: facility.service,
    signing: signing.service,
    orders,
    animals,
    documents,
    publicUrl: outside.publicUrl ?? '',
  })
  const handover = createHandover(parts)
  const bench = createBench({ ...parts, facility: facility.service })
  const today = createToday({
    ...parts,
    facility: facility.service,
    people,
    enclosures,
    water,
    animals,
    quarantine,
    permits,
    acquisitions,
    orders,
    administrations,
    handover,
  })
  return {
    parts,
    lockout,
    authenticator,
    facility,
    people,
    signing,
    cautions,
    enclosures,
    water,
    formulary,
    animals,
    documents,
    counterparties,
    permits,
    acquisitions,
    exports,
    orders,
    administrations,
    quarantine,
    handover,
    today,
    routes: [
      ...signInRoutes({ authenticator, lockout, people, readMe }),
      ...people.routes,
      ...facility.routes,
      ...audit.routes,
      ...signing.routes,
      ...enclosures.routes,
      ...water.routes,
      ...formulary.routes,
      ...cautions.routes,
      ...animals.routes,
      ...documents.routes,
      ...counterparties.routes,
      ...permits.routes,
      ...acquisitions.routes,
      ...exports.routes,
      ...orders.routes,
      ...administrations.routes,
      ...quarantine.routes,
      ...handover.routes,
      ...today.routes,
      ...bench.routes,
    ],
    /** Handlers of background work, by name. */
    jobs: { ...quarantine.jobs },
    /** Ends what runs beside the requests. */
    close: async () => {
      parts.mail.close()
      await parts.pdf.close()
    },
  }
}

export type Composition = ReturnType<typeof compose>
