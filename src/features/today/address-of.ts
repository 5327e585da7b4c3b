import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { paths } from '../../lib/paths.ts'

type Params = (key: string) => string

const toCase = (told: Params) => paths.quarantineCase(told('case'))
const toOrder = (told: Params) => paths.order(told('number'))
const toDose = (told: Params) => paths.orderSheet(told('number'), told('key'))
const toAnimal = (told: Params) => paths.animal(told('accession'))
const toPerson = (told: Params) => paths.person(told('personId'))
const toVolumes = (told: Params) => paths.enclosureVolumes(told('enclosure'))
const toBodies = (told: Params) =>
  told('case') === '' ? paths.quarantine() : paths.quarantineCase(told('case'))
const toCaseOrPlace = (told: Params) =>
  told('case') === '' ? paths.enclosure(told('enclosure')) : paths.quarantineCase(told('case'))

const addresses: Record<TodayWork['kind'], (told: Params) => string> = {
  'urgent-call': (told) => paths.urgentCall(told('noticeId')),
  'own-licence': () => paths.ownSettings(),
  'observation-flagged': toCaseOrPlace,
  'order-held': toOrder,
  'case-held': toCase,
  'order-proposed': toOrder,
  'order-draft': toOrder,
  'case-ready': (told) => paths.clearCase(told('case')),
  'dose-exceptions': toDose,
  'discrepancy-veterinarian': toAnimal,
  'bodies-veterinarian': toBodies,
  'bath-running': toDose,
  'second-calculation': toDose,
  dose: toDose,
  'order-not-carried-out': toOrder,
  sample: toCase,
  'volume-to-confirm': toVolumes,
  'volume-check': (told) => paths.enclosureVolume(told('enclosure')),
  'outside-case': (told) => paths.enclosure(told('enclosure')),
  'case-to-close': toCase,
  observation: (told) => paths.observe(told('enclosure')),
  care: toCase,
  'discrepancy-registrar': toAnimal,
  'bodies-registrar': toBodies,
  'movement-marked': toAnimal,
  'transaction-marks': (told) => paths.transaction(told('number')),
  'transaction-papers': (told) =>
    told('count') === '' ? paths.transaction(told('number')) : paths.register(),
  'permit-marks': (told) => paths.permit(told('number')),
  'permit-runs-out': (told) => paths.permit(told('number')),
  'account-without-licence': toPerson,
  'licence-ends': toPerson,
  'signing-locked': toPerson,
  'account-without-sign-in': toPerson,
  'setting-proposed': () => paths.facility(),
  'settings-default': () => paths.facility(),
}

/** Where a piece of work is done. What is done already leads to where it is written down. */
export function addressOfWork(item: TodayWork): string {
  const told = (key: string) => String(item.params[key] ?? '')
  if (item.kind === 'observation' && item.state === 'done') return toCase(told)
  return addresses[item.kind](told)
}
