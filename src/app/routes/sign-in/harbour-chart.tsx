import type { ReactNode } from 'react'
import { signInWords } from '../../../../shared/messages/sign-in.ts'
import { AnchorMark } from '../../../ui/empty-harbour.tsx'
import { StepMark } from '../../../ui/step-mark.tsx'
import { fiveMetres, land, soundings, tenMetres, threeMetres } from './coast-data.ts'

const width = 1408
const height = 846
const meridians = [176, 352, 528, 704, 880, 1056, 1232]
const parallels = [141, 282, 423, 564, 705]

/** The invented harbour, with an animal's course running in. Decoration, hidden from readers; what stands on it is not. */
export function HarbourChart({ children }: { children: ReactNode }) {
  return (
    <div className="graduated-border">
      <div className="harbour-chart">
        <svg viewBox={`0 0 ${width} ${height}`} preserveAspectRatio="xMidYMid slice" aria-hidden="true">
          <path d={fiveMetres} fill="var(--shallow)" opacity=".75" />
          <path d={fiveMetres} className="p-contour" />
          <path d={tenMetres} className="p-contour" strokeDasharray="7 3" />
          <path d={threeMetres} fill="var(--shallow-2)" opacity=".7" />
          <path d={threeMetres} className="p-contour" />
          <path d={land} className="p-land" />
          <path d={land} className="p-coast" strokeWidth="1.3" />
          {meridians.map((x) => (
            <path key={x} d={`M${x} 0V${height}`} className="chart-grid" />
          ))}
          {parallels.map((y) => (
            <path key={y} d={`M0 ${y}H${width}`} className="chart-grid" />
          ))}
          {soundings.map(({ x, y, metres }) => (
            <Sounding key={`${x} ${y}`} x={x} y={y} metres={metres} />
          ))}
          <Course />
          <CompassRose x={182} y={650} />
          <text x="120" y="120" className="chart-sea" fontSize="22">
            {signInWords.seaSound}
          </text>
          <text x="352" y="222" className="s-12 s-2 mid">
            {signInWords.seaSallows}
          </text>
          <text x="760" y="566" className="chart-place" fontSize="17">
            {signInWords.seaPoint}
          </text>
          <text x="886" y="728" className="s-12 s-2">
            {signInWords.seaRoad}
          </text>
          <text x="500" y="790" className="chart-sea" fontSize="15">
            {signInWords.seaBank}
          </text>
        </svg>
        {children}
      </div>
    </div>
  )
}

/** A depth as charts print it: metres, and the decimetre small and low. */
function Sounding({ x, y, metres }: { x: number; y: number; metres: string }) {
  const [whole, tenth] = metres.split('.')
  return (
    <text x={x} y={y} className="chart-sounding">
      {whole}
      {tenth === undefined ? null : (
        <tspan dy="3" fontSize="8">
          {tenth}
        </tspan>
      )}
    </text>
  )
}

/** Three fixes made, two to come, and the harbour: a quarantine of which 21 days are over. */
function Course() {
  return (
    <g>
      <path d="M60 470L300 452L520 404L586 520" className="p-course" />
      <path d="M586 520L640 662L842 690" className="p-ahead" />
      <StepMark state="done" x={60} y={470} />
      <StepMark state="done" x={300} y={452} />
      <StepMark state="done" x={520} y={404} />
      <StepMark state="to-come" x={586} y={520} />
      <StepMark state="to-come" x={640} y={662} />
      <AnchorMark x={858} y={694} scale={1.5} met />
      <rect x="52.5" y="436.5" width="15" height="15" fill="var(--q)" stroke="var(--ink)" />
      <text x="60" y="492" className="s-12 s-n s-2 mid">
        {signInWords.seaDay({ day: 0 })}
      </text>
      <text x="304" y="474" className="s-12 s-n s-2 mid">
        {signInWords.seaDay({ day: 10 })}
      </text>
      <text x="514" y="390" className="s-12 s-n s-2 mid">
        {signInWords.seaDay({ day: 21 })}
      </text>
    </g>
  )
}

function CompassRose({ x, y }: { x: number; y: number }) {
  const ticks = Array.from({ length: 72 }, (_, i) => {
    const angle = (i * 5 * Math.PI) / 180
    const inner = i % 6 === 0 ? 90 : i % 2 === 0 ? 96 : 100
    const at = (radius: number) =>
      `${(Math.sin(angle) * radius).toFixed(1)} ${(-Math.cos(angle) * radius).toFixed(1)}`
    return `M${at(inner)}L${at(104)}`
  })
  return (
    <g transform={`translate(${x} ${y})`} stroke="var(--ink-3)" fill="none" strokeWidth=".8">
      <circle r="104" />
      <circle r="96" />
      <circle r="64" />
      <path d={ticks.join('')} />
      <path d="M0 -124L7 -104L0 -64L-7 -104Z" fill="var(--ink-2)" stroke="none" />
      <path d="M0 -64V64M-64 0H64" />
      {[
        ['090', 80, 4],
        ['180', 0, 84],
        ['270', -80, 4],
      ].map(([text, tx, ty]) => (
        <text key={text} x={tx} y={ty} className="s-11 s-2 mid" stroke="none">
          {text}
        </text>
      ))}
    </g>
  )
}
