import { waterWords } from '../../../shared/messages/water-sheet.ts'
import type { DrawnPart, VolumeDrawing as Drawing } from './volume-drawing-model.ts'

/** A valve at the edge of the water, as it stands. */
export interface EdgeValve {
  code: string
  /** What lies behind it. */
  to: string
  state: 'open' | 'shut' | 'unknown'
  since: string | null
}

const surface = 92
const floor = 216
const sumpSurface = 300
const sumpFloor = 356
const mostValves = 2

/** The volume worksheet as a long section: tanks above, sumps below, pipes between, and the valves at its edge. */
export function VolumeDrawing({
  code,
  drawing,
  valves,
}: {
  code: string
  drawing: Drawing
  valves: readonly EdgeValve[]
}) {
  const { tanks, sumps, displacedText, pipeText, pipeLitresText, inWords } = drawing
  const [first] = tanks
  const last = tanks.at(-1)
  const height = sumps.length > 0 || valves.length > 0 ? 392 : 250
  return (
    <svg
      className="section-drawing"
      viewBox={`0 0 650 ${String(height)}`}
      role="img"
      aria-label={waterWords.drawingLabel({ code, parts: inWords })}
    >
      <text x="60" y="20" className="is-small">
        {waterWords.notToScale}
      </text>
      {first?.acrossText && tanks.length === 1 ? <Across part={first} /> : null}
      {tanks.map((part, i) => (
        <Tank
          key={part.key}
          part={part}
          isOnly={tanks.length === 1}
          displaced={i === 0 ? displacedText : null}
        />
      ))}
      {last?.depthText && tanks.length === 1 ? (
        <Depth x={last.x + last.width + 30} text={last.depthText} />
      ) : null}
      {pipeText ? (
        <>
          <path d={pipePath(tanks, sumps)} className="p-line" />
          <text x="262" y="250">
            <tspan className="is-strong">{waterWords.pipes}</tspan>
            {`  ${pipeText}`}
          </text>
          <text x="262" y="280" className="is-small">
            {pipeLitresText}
          </text>
        </>
      ) : null}
      {sumps.map((part) => (
        <Sump key={part.key} part={part} />
      ))}
      {valves.slice(0, mostValves).map((valve, i) => (
        <Valve key={valve.code} valve={valve} y={259 + i * 76} />
      ))}
    </svg>
  )
}

function Across({ part }: { part: DrawnPart }) {
  const end = part.x + part.width
  const middle = part.x + part.width / 2
  const words = waterWords.inside({ length: part.acrossText })
  const half = 4 + words.length * 3.6
  return (
    <>
      <path
        d={`M${part.x} 42H${end}M${part.x} 37v10M${end} 37v10M${part.x + 8} 39l-8 3l8 3M${end - 8} 39l8 3l-8 3`}
        className="p-line"
      />
      <rect x={middle - half} y="33" width={half * 2} height="18" className="under-text" />
      <text x={middle} y="47" className="is-strong is-middle">
        {words}
      </text>
    </>
  )
}

function Depth({ x, text }: { x: number; text: string }) {
  return (
    <>
      <path
        d={`M${x} ${surface}V${floor}M${x - 5} ${surface}h10M${x - 5} ${floor}h10M${x - 3} ${surface + 8}l3 -8l3 8M${x - 3} ${floor - 8}l3 8l3 -8`}
        className="p-line"
      />
      <text x={x + 11} y="150" className="is-strong">
        {text}
      </text>
      <text x={x + 11} y="166" className="is-small">
        {waterWords.deep}
      </text>
    </>
  )
}

function Tank({ part, isOnly, displaced }: { part: DrawnPart; isOnly: boolean; displaced: string | null }) {
  const { x, width, cone } = part
  const end = x + width
  const bottom = cone ? `L${x + width / 2} ${floor}L${end} ${floor - 44}` : `V${floor}H${end}`
  const wall = cone ? floor - 44 : floor
  return (
    <>
      <path d={`M${x} ${surface}V${wall}${bottom}V${surface}Z`} className="water" />
      <path d={`M${x} 62V${wall}${bottom}V62`} className="wall" />
      <path d={`M${x} ${surface}H${end}`} className="surface" />
      <path d={`M${end - 18} ${surface - 8}l6 -8h-12z`} className="p-ink" />
      {displaced && width > 300 ? (
        <>
          <path
            d={`M${x + 70} ${floor}V${floor - 24}a20 20 0 0 1 40 0V${floor}M${x + 172} ${floor}V${floor - 24}a20 20 0 0 1 40 0V${floor}`}
            className="rock"
          />
          <text x={x + 226} y={floor - 12} className="is-small">
            {`${displaced} ${waterWords.displacedMark}`}
          </text>
        </>
      ) : null}
      <text x={x + 20} y="118">
        <tspan className="is-strong">{part.name}</tspan>
        {isOnly ? `  ${part.otherText}` : ''}
      </text>
      {isOnly || width < 150 ? null : (
        <text x={x + 20} y="136" className="is-small">
          {part.allText}
        </text>
      )}
      <text x={x + 20} y={isOnly ? 136 : 154} className="is-small">
        {part.litresText}
      </text>
    </>
  )
}

function Sump({ part }: { part: DrawnPart }) {
  const { x, width } = part
  return (
    <>
      <rect x={x} y={sumpSurface} width={width} height={sumpFloor - sumpSurface} className="water" />
      <path d={`M${x} 282V${sumpFloor}H${x + width}V282`} className="wall" />
      <path d={`M${x} ${sumpSurface}H${x + width}`} className="surface" />
      <text x={x + 16} y="326">
        <tspan className="is-strong">{part.name}</tspan>
        {`  ${part.allText}`}
      </text>
      <text x={x + 16} y="344" className="is-small">
        {`+ ${part.litresText}`}
      </text>
    </>
  )
}

/** From each tank down to the sump, and back up; without a sump, along the floors. */
function pipePath(tanks: readonly DrawnPart[], sumps: readonly DrawnPart[]): string {
  const [sump] = sumps
  const [tank] = tanks
  if (!sump || !tank) return ''
  const last = tanks.at(-1) ?? tank
  const down = last.x + last.width - 34
  const up = tank.x + 28
  return (
    `M${down} ${floor}V258H${sump.x + sump.width - 46}V${sumpSurface}M${down + 4} ${floor}V262H${sump.x + sump.width - 42}V${sumpSurface}` +
    `M${sump.x + 28} ${sumpSurface}V240H${up}V${floor}M${sump.x + 32} ${sumpSurface}V236H${up + 4}V${floor}`
  )
}

/** Two triangles; shut has a cross over it, open a stroke that goes through. The words say the same. */
function Valve({ valve, y }: { valve: EdgeValve; y: number }) {
  const words = {
    open: waterWords.valveOpen(valve),
    shut: waterWords.valveShut(valve),
    unknown: waterWords.valveUnknown(valve),
  }[valve.state]
  return (
    <g transform={`translate(548 ${y})`}>
      <path
        d="M-40 0H-16M16 0H44"
        className="p-line"
        strokeDasharray={valve.state === 'open' ? undefined : '3 3'}
      />
      <path d="M-16 -9L16 9V-9L-16 9Z" className={valve.state === 'open' ? 'p-ink' : 'p-to-come'} />
      {valve.state === 'shut' ? <path d="M-6 -20L6 -8M6 -20L-6 -8" className="p-failed" /> : null}
      <text x="0" y="27" className="is-strong is-middle is-small">
        {words}
      </text>
      {valve.since ? (
        <text x="0" y="42" className="is-small is-middle">
          {waterWords.since({ at: valve.since })}
        </text>
      ) : null}
    </g>
  )
}
