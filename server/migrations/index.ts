import { Foundation1764600000001 } from './0001-foundation.ts'
import { Water1764600000002 } from './0002-water.ts'
import { Animals1764600000003 } from './0003-animals.ts'
import { Register1764600000004 } from './0004-register.ts'
import { Quarantine1764600000011 } from './0011-quarantine.ts'
import { Signing1764600000010 } from './0010-signing.ts'
import { Formulary1764600000012 } from './0012-formulary.ts'
import { Orders1764600000013 } from './0013-orders.ts'
import { Notices1764600000014 } from './0014-notices.ts'
import { Handover1764600000016 } from './0016-handover.ts'
import { LotLooks1764600000019 } from './0019-lot-looks.ts'
import { AmountsSeen1764600000023 } from './0023-amounts-seen.ts'
import { RecordRequests1764600000024 } from './0024-record-requests.ts'
import { DoseVoids1764600000025 } from './0025-dose-voids.ts'
import { Bodies1764600000026 } from './0026-bodies.ts'
import { PlainText1764600000029 } from './0029-plain-text.ts'
import { RowMarks1764600000032 } from './0032-row-marks.ts'
import { DoseOverrides1764600000033 } from './0033-dose-overrides.ts'
import { EndsThatCount1764600000034 } from './0034-ends-that-count.ts'
import { MarksByKey1764600000035 } from './0035-marks-by-key.ts'
import { AmountsPreviewed1764600000036 } from './0036-amounts-previewed.ts'
import { RowsAsWritten1764600000037 } from './0037-rows-as-written.ts'
import { AmountsLearnt1764600000038 } from './0038-amounts-learnt.ts'
import { SignInsOfAnAddress1764600000039 } from './0039-sign-ins-of-an-address.ts'
import { RowMarkLookup1764600000040 } from './0040-row-mark-lookup.ts'
import { DosesOfGoneOrders1764600000041 } from './0041-doses-of-gone-orders.ts'
import { CalculationsAgreed1764600000042 } from './0042-calculations-agreed.ts'
import { OrdersAlikeByWater1764600000043 } from './0043-orders-alike-by-water.ts'
import { ContactsOfDoses1764600000044 } from './0044-contacts-of-doses.ts'
import { BodiesNamedAgain1764600000045 } from './0045-bodies-named-again.ts'
import { ContactsNeedAnEnd1764600000050 } from './0050-contacts-need-an-end.ts'
import { StandingLockLifts1764600000051 } from './0051-standing-lock-lifts.ts'
import { LiftsOneByOne1764600000052 } from './0052-lifts-one-by-one.ts'
import { WeakAndHandled1764600000053 } from './0053-weak-and-handled.ts'
import { RuleParameters1764600000059 } from './0059-rule-parameters.ts'
import { FoodOrRelease1764600000062 } from './0062-food-or-release.ts'

/** Every migration in order. One that has landed is never edited: add another. */
export const migrations = [
  // one a line
  Foundation1764600000001,
  Water1764600000002,
  Animals1764600000003,
  Register1764600000004,
  Signing1764600000010,
  Quarantine1764600000011,
  Formulary1764600000012,
  Orders1764600000013,
  Notices1764600000014,
  Handover1764600000016,
  LotLooks1764600000019,
  AmountsSeen1764600000023,
  RecordRequests1764600000024,
  DoseVoids1764600000025,
  Bodies1764600000026,
  PlainText1764600000029,
  RowMarks1764600000032,
  DoseOverrides1764600000033,
  EndsThatCount1764600000034,
  MarksByKey1764600000035,
  AmountsPreviewed1764600000036,
  RowsAsWritten1764600000037,
  AmountsLearnt1764600000038,
  SignInsOfAnAddress1764600000039,
  RowMarkLookup1764600000040,
  DosesOfGoneOrders1764600000041,
  CalculationsAgreed1764600000042,
  OrdersAlikeByWater1764600000043,
  ContactsOfDoses1764600000044,
  BodiesNamedAgain1764600000045,
  ContactsNeedAnEnd1764600000050,
  StandingLockLifts1764600000051,
  LiftsOneByOne1764600000052,
  WeakAndHandled1764600000053,
  RuleParameters1764600000059,
  FoodOrRelease1764600000062,
]
