import { contactTimeValue, effectiveMinutes } from '../../../shared/domain/disinfection/contact-time.ts'
import { appliedOzoneDose } from '../../../shared/domain/disinfection/ozone-dose.ts'
import type { Runner } from '../published-case.ts'
import { figure, numberOf } from './reading-inputs.ts'

export const disinfectionRunners: Readonly<Record<string, Runner>> = {
  ct_mg_min_per_L: (inputs) => {
    const minutes = effectiveMinutes({
      contactVolumeLitres: numberOf(inputs, 'contact_volume_L'),
      flowLPerMin: numberOf(inputs, 'flow_L_per_min'),
      bafflingFactor: numberOf(inputs, 'baffling_factor'),
    })
    if (!minutes.ok) return minutes
    const residualMgPerL = numberOf(inputs, 'residual_mg_per_L')
    return figure(contactTimeValue({ residualMgPerL, minutes: minutes.value }), Number, {})
  },
  ozone_dose_mg_per_L: (inputs) =>
    figure(
      appliedOzoneDose({
        ozoneGPerH: numberOf(inputs, 'ozone_g_per_h'),
        flowM3PerH: numberOf(inputs, 'flow_m3_per_h'),
      }),
      Number,
      {},
    ),
}
