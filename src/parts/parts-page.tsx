import { partsPageWords as words } from '../../shared/messages/parts-page.ts'
import { AmountParts, CautionParts } from './block-parts.tsx'
import { ButtonParts, ChoiceParts, FieldParts, FlagParts } from './control-parts.tsx'
import { DrawingParts } from './drawing-parts.tsx'
import { ListParts } from './list-parts.tsx'
import { OverlayParts } from './overlay-parts.tsx'

/** Every part of the design system in all its states and both themes. For building; never in the production bundle. */
export function Component() {
  return (
    <main id="chart" tabIndex={-1}>
      <h1 className="visually-hidden">{words.title}</h1>
      <div className="grid xl:grid-cols-2">
        <Half theme="day" heading={words.day} />
        <Half theme="night" heading={words.night} />
      </div>
      <Whole theme="day" />
      <Whole theme="night" />
    </main>
  )
}

function Half({ theme, heading }: { theme: 'day' | 'night'; heading: string }) {
  return (
    <div data-theme={theme} className="bg-paper text-ink p-6 stack gap-4 min-w-0">
      <h2 className="t-title">{heading}</h2>
      <ButtonParts />
      <FieldParts />
      <ChoiceParts />
      <FlagParts />
      <CautionParts />
      <AmountParts />
      <ListParts />
      <OverlayParts />
    </div>
  )
}

function Whole({ theme }: { theme: 'day' | 'night' }) {
  return (
    <div data-theme={theme} className="bg-paper text-ink p-4 stack gap-4 min-w-0">
      <DrawingParts />
    </div>
  )
}
