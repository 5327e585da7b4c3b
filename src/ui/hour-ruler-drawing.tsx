import type { RulerGeometry } from './hour-ruler-geometry.ts'

/** The drawing of the hour ruler. Hidden from readers: the list of links beside it says the same. */
export function HourRulerDrawing({ ruler, now }: { ruler: RulerGeometry; now: string }) {
  const { width, nowX } = ruler
  return (
    <svg viewBox={`0 0 ${width} 38`} aria-hidden="true">
      {ruler.overdue.rings.map((x) => (
        <g key={x}>
          <circle cx={x} cy="9" r="3.4" fill="var(--paper)" stroke="var(--magenta)" strokeWidth="1.8" />
          <circle cx={x} cy="9" r="6.2" fill="none" stroke="var(--magenta)" strokeWidth="1" />
        </g>
      ))}
      {ruler.overdue.words ? (
        <text x={ruler.overdue.words.x} y="13" className="s-11 s-b s-m s-n">
          {ruler.overdue.words.text}
        </text>
      ) : null}
      {ruler.overdue.number ? (
        <text x="2" y="13" className="s-13 s-b s-m">
          {ruler.overdue.number}
        </text>
      ) : null}
      {ruler.hourNames.map((hour) => (
        <text key={hour.text} x={hour.x} y="13" className="s-10 s-3 mid">
          {hour.text}
        </text>
      ))}
      {ruler.ranks.map((rank) => (
        <g key={rank.x}>
          {rank.ticks.map((tick) =>
            tick.hollow ? (
              <rect
                key={tick.x}
                x={tick.x + 0.5}
                y="17.5"
                width={ruler.tickWidth - 1}
                height="11.5"
                fill="var(--paper)"
                stroke="var(--ink-3)"
              />
            ) : (
              <rect key={tick.x} x={tick.x} y="17" width={ruler.tickWidth} height="12" className="p-ink" />
            ),
          )}
          {rank.count ? (
            <text
              x={rank.count.x}
              y="27"
              className={`s-11 s-n ${rank.count.ink ? 's-b' : 's-2'} ${rank.count.anchor === 'end' ? 'end' : ''}`}
            >
              {rank.count.text}
            </text>
          ) : null}
        </g>
      ))}
      <rect x=".5" y="29.5" width={width - 1} height="8" fill="var(--paper)" stroke="var(--ink)" />
      {ruler.grades.map((grade) => (
        <rect key={grade.x} x={grade.x} y="31.5" width={grade.width} height="4" className="p-ink" />
      ))}
      <path d={`M${nowX} 9V37`} stroke="var(--ink)" strokeWidth="1.5" />
      <path d={`M${nowX - 5} 2h10l-5 7z`} className="p-ink" />
      <text
        x={ruler.nowTextLeft ? nowX - 9 : nowX + 9}
        y="12"
        className={`s-11 s-b ${ruler.nowTextLeft ? 'end' : ''}`}
      >
        {now}
      </text>
    </svg>
  )
}
