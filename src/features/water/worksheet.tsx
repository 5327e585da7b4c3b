import { History, Ruler } from 'lucide-react'
import type { WaterOfEnclosure } from '../../../shared/contracts/water.contract.ts'
import { formatVolume } from '../../../shared/domain/quantities/format-volume.ts'
import { formatWorkingValue } from '../../../shared/domain/quantities/format-working-value.ts'
import { litresPerCentimetre } from '../../../shared/domain/water/litres-per-centimetre.ts'
import type { VolumeSheet } from '../../../shared/domain/water/volume-sheet.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { paths } from '../../lib/paths.ts'
import { ButtonLink } from '../../ui/button-link.tsx'
import { CautionBlock } from '../../ui/caution-block.tsx'
import { useMedia } from '../../ui/use-media.ts'
import { VolumeDrawing } from './volume-drawing.tsx'
import type { EdgeValve } from './volume-drawing.tsx'
import { volumeDrawing } from './volume-drawing-model.ts'
import { VolumeWorking, workingLinesOf } from './volume-working.tsx'

/** The valves that part this water from other water, as the drawing shows them. */
export function edgeValves(water: WaterOfEnclosure, sayWhen: (at: string) => string): EdgeValve[] {
  const here = new Set(water.bodies.map((body) => body.id))
  return water.connections
    .filter((row) => !row.inside)
    .map((row) => ({
      code: row.code,
      to: here.has(row.fromBodyId) ? row.toCode : row.fromCode,
      state: row.state,
      since: row.since ? sayWhen(row.since) : null,
    }))
}

/** The volume worksheet in force: its section drawing, its working, and what a centimetre is worth. */
export function Worksheet({
  water,
  mayMeasure,
  mayOnlyPropose,
  sayWhen,
}: {
  water: WaterOfEnclosure
  mayMeasure: boolean
  mayOnlyPropose: boolean
  sayWhen: (at: string) => string
}) {
  const phone = useMedia('(max-width: 600px)')
  const { code } = water.enclosure
  const { volume } = water.volume
  const sheet = volume?.sheet as VolumeSheet | undefined
  const lines = workingLinesOf(volume?.working ?? [])
  const drawing = sheet ? volumeDrawing(sheet, lines) : null
  const centimetre = sheet ? centimetreWords(sheet, volume?.netVolumeLitres ?? 0) : null
  const drawn = drawing ? (
    <VolumeDrawing code={code} drawing={drawing} valves={edgeValves(water, sayWhen)} />
  ) : null
  const measureWord = mayOnlyPropose
    ? waterWords.proposeVolume
    : volume
      ? waterWords.measureAgain
      : waterWords.measureFirst
  return (
    <section className="pane ink-pane">
      <div className="row row-between row-wrap">
        <h2 className="t-head">{waterWords.worksheet}</h2>
        <span className="row row-wrap">
          {volume ? (
            <ButtonLink size="small" icon={History} to={paths.enclosureVolumes(code)}>
              {waterWords.allVolumes}
            </ButtonLink>
          ) : null}
          {mayMeasure ? (
            <ButtonLink size="small" kind="primary" icon={Ruler} to={paths.enclosureVolume(code)}>
              {measureWord}
            </ButtonLink>
          ) : null}
        </span>
      </div>
      {volume ? null : <p className="t-2 mt-2">{waterWords.noWorksheet}</p>}
      {drawn && phone ? (
        <details className="mt-2">
          <summary>{waterWords.showDrawing}</summary>
          <div className="overflow-x-auto">
            <div className="w-[650px]">{drawn}</div>
          </div>
        </details>
      ) : (
        drawn
      )}
      {lines.length > 0 ? (
        <div className="sums mt-4">
          <VolumeWorking lines={lines} />
          {centimetre ? <CautionBlock level="note">{centimetre}</CautionBlock> : null}
        </div>
      ) : null}
    </section>
  )
}

/** What a mark read 1 cm wrong is worth, for a water with one tank: the slip that is made most often. */
function centimetreWords(sheet: VolumeSheet, netVolumeLitres: number): string | null {
  if (sheet.method !== 'geometry' || netVolumeLitres <= 0) return null
  const tanks = sheet.parts.filter((part) => part.role !== 'sump')
  const [tank] = tanks
  if (!tank || tanks.length > 1) return null
  const litres = litresPerCentimetre(tank.shape)
  if (!litres.ok || litres.value === undefined) return null
  const percent = formatWorkingValue({
    value: Number(((litres.value / netVolumeLitres) * 100).toPrecision(2)),
    unit: 'percent',
    code: 'change-fraction',
  })
  return waterWords.oneCentimetre({
    part: tank.name ?? waterWords.theTank,
    litres: formatVolume(litres.value).text,
    percent: percent.text,
  })
}
