import { thing } from './thing.ts'

export const Sound = (props: { on: boolean }) => (
  <p className={props.on ? 'font-bold' : 'font-normal'} aria-label={thing.name} role="status">
    {thing.name} <a href="/animals">{props.on ? thing.name : '—'}</a> {`${thing.name} 1`} · 2 × 3
  </p>
)
