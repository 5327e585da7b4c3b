import { formatVolumeWithError } from '../../../shared/domain/quantities/format-volume-with-error.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import type { UnitOf } from '../../../shared/domain/units/unit-table.ts'
import type { WaterOfEnclosure } from '../../../shared/contracts/water.contract.ts'
import type { Volume } from '../../../shared/contracts/water-facts.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { volumeMethodNames } from '../../../shared/messages/water.ts'
import { volumeRefusalWords, waterWords } from '../../../shared/messages/water-sheet.ts'
import { CautionBlock } from '../../ui/caution-block.tsx'
import { Quantity } from '../../ui/quantity.tsx'

/** The unit a person reads volumes in; litres unless they chose another. */
export function volumeUnitOf(preference: string | undefined): UnitOf<'volume'> {
  return isUnitCode(preference) && unitOf(preference).dimension === 'volume'
    ? (preference as UnitOf<'volume'>)
    : 'L'
}

/** A net volume to its error, in the reader's unit. */
export function netVolumeText(
  volume: Pick<Volume, 'netVolumeLitres' | 'errorPercent'>,
  unit: UnitOf<'volume'>,
) {
  return formatVolumeWithError(volume.netVolumeLitres, volume.errorPercent ?? 0, unit)
}

/** Where a volume comes from, in sentences. */
export function volumeSentences(volume: Volume, zone: string): string[] {
  const shut = volume.valves.filter((valve) => !valve.open).map((valve) => valve.code)
  const { confirmation } = volume
  return [
    waterWords.covers({ codes: volume.codes.join(', ') }),
    ...(shut.length > 0 ? [waterWords.shutValves({ codes: shut.join(', ') })] : []),
    ...(volume.isolationId ? [waterWords.underIsolation] : []),
    waterWords.measuredOn({
      method: volumeMethodNames[volume.method],
      on: sayDate(volume.happenedOn),
      by: volume.recordedBy,
    }),
    ...(confirmation
      ? [waterWords.confirmedOn({ on: sayDate(facilityDateOf(confirmation.at, zone)), by: confirmation.by })]
      : []),
    ...(volume.nextCheckOn ? [waterWords.nextCheck({ on: sayDate(volume.nextCheckOn) })] : []),
  ]
}

/** The number that every dose into this water is worked out from, or why there is none. */
export function NetVolume({
  water,
  zone,
  volumeUnit,
}: {
  water: WaterOfEnclosure
  zone: string
  volumeUnit: string | undefined
}) {
  const { volume, usable, refusal } = water.volume
  const { fillMark } = water.enclosure
  if (water.bodies.length === 0)
    return (
      <section className="net-volume">
        <h2 className="t-label">{waterWords.netVolume}</h2>
        <p>{waterWords.landTitle}</p>
      </section>
    )
  return (
    <section className="net-volume">
      <h2 className="t-label">{waterWords.netVolume}</h2>
      {volume ? (
        <p>
          <Quantity of={netVolumeText(volume, volumeUnitOf(volumeUnit))} size={usable ? 'dose' : 'mid'} />
        </p>
      ) : (
        <p className="sea-name">{waterWords.noVolume}</p>
      )}
      {fillMark ? (
        <p>
          {waterWords.fillMark({
            mark: fillMark.mark,
            volume: `${fillMark.volume.value}\u00a0${isUnitCode(fillMark.volume.unit) ? unitOf(fillMark.volume.unit).symbol : fillMark.volume.unit}`,
          })}
        </p>
      ) : null}
      {volume ? <p className="t-2">{volumeSentences(volume, zone).join(' ')}</p> : null}
      {usable ? null : (
        <CautionBlock level="warning" title={waterWords.volumeNotUsable}>
          {refusal !== null && refusal in volumeRefusalWords
            ? volumeRefusalWords[refusal as keyof typeof volumeRefusalWords]
            : volumeRefusalWords['no-determination']}
        </CautionBlock>
      )}
    </section>
  )
}
