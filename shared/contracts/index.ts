import type { Contract } from './contract.ts'
import * as acquisitions from './acquisitions.contract.ts'
import * as adverseEvents from './adverse-events.contract.ts'
import * as animalRecords from './animal-records.contract.ts'
import * as animals from './animals.contract.ts'
import * as audit from './audit.contract.ts'
import { askUnknownCalculator, benchContracts, listCalculators, printBenchSheet } from './bench.contract.ts'
import * as benchQuestions from './bench-questions.contract.ts'
import * as caseEvents from './case-events.contract.ts'
import * as cautionFirings from './caution-firings.contract.ts'
import * as cautionRules from './caution-rules.contract.ts'
import * as clearance from './clearance.contract.ts'
import * as enclosures from './enclosures.contract.ts'
import * as counterparties from './counterparties.contract.ts'
import * as documents from './documents.contract.ts'
import * as exports from './exports.contract.ts'
import * as find from './find.contract.ts'
import * as facility from './facility.contract.ts'
import * as formulary from './formulary.contract.ts'
import * as doses from './doses.contract.ts'
import * as orders from './orders.contract.ts'
import * as handover from './handover.contract.ts'
import * as notices from './notices.contract.ts'
import * as observations from './observations.contract.ts'
import * as people from './people.contract.ts'
import * as permits from './permits.contract.ts'
import * as protocols from './protocols.contract.ts'
import * as quarantine from './quarantine.contract.ts'
import * as signing from './signing.contract.ts'
import * as signIn from './sign-in.contract.ts'
import * as today from './today.contract.ts'
import * as water from './water.contract.ts'
import * as waterCases from './water-cases.contract.ts'
import * as waterMap from './water-map.contract.ts'
import * as waterVolumes from './water-volumes.contract.ts'

import * as weightOrders from './weight-orders.contract.ts'
import * as taxa from './taxa.contract.ts'

/** Modules that hold contracts; a new feature adds its own here. */
const modules = [
  // one a line
  signIn,
  people,
  facility,
  audit,
  signing,
  enclosures,
  water,
  waterMap,
  waterVolumes,
  formulary,
  cautionFirings,
  cautionRules,
  orders,
  weightOrders,
  adverseEvents,
  doses,
  taxa,
  animals,
  animalRecords,
  documents,
  counterparties,
  permits,
  acquisitions,
  exports,
  protocols,
  quarantine,
  waterCases,
  caseEvents,
  clearance,
  observations,
  notices,
  handover,
  today,
  find,
  { listCalculators, ...benchContracts, ...benchQuestions, askUnknownCalculator, printBenchSheet },
]

const isContract = (value: unknown): value is Contract =>
  typeof value === 'object' && value !== null && 'method' in value && 'path' in value && 'reply' in value

/** Every contract there is: the API documents and the walking tests start here. */
export const allContracts: readonly Contract[] = modules.flatMap((module) =>
  Object.values(module as Record<string, unknown>).filter(isContract),
)
