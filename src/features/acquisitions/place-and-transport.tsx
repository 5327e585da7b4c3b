import { transactionFormWords as words } from '../../../shared/messages/register-sheet.ts'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { TextField } from '../../ui/text-field.tsx'
import { useFormField } from './form-field.ts'

/** Where they were collected, found or released. */
export function PlaceFields({ way }: { way: 'in' | 'out' }) {
  const { field } = useFormField()
  return (
    <details className="fold">
      <summary>{way === 'in' ? words.place : words.placeOut}</summary>
      <div className="stack gap-3">
        <TextField label={words.locality} optional {...field('place.locality')} />
        {way === 'in' ? (
          <div className="pair">
            <TextField label={words.placeOn} hint={words.onHint} optional {...field('place.on')} />
            <TextField label={words.method} optional {...field('place.method')} />
          </div>
        ) : null}
        <div className="pair">
          <TextField label={words.latitude} optional inputMode="decimal" {...field('place.latitude')} />
          <TextField label={words.longitude} optional inputMode="decimal" {...field('place.longitude')} />
        </div>
        <TextField
          label={words.uncertainty}
          optional
          inputMode="decimal"
          {...field('place.uncertaintyMetres')}
        />
      </div>
    </details>
  )
}

/** How they travelled. */
export function TransportFields() {
  const { field } = useFormField()
  return (
    <details className="fold">
      <summary>{words.transport}</summary>
      <div className="stack gap-3">
        <div className="pair">
          <TextField label={words.carrier} optional {...field('transport.carrier')} />
          <TextField label={words.waybill} optional {...field('transport.waybill')} />
        </div>
        <TextField label={words.boxCount} optional inputMode="numeric" {...field('transport.boxCount')} />
        <div className="pair">
          <TextField label={words.sealedAt} optional type="datetime-local" {...field('transport.sealedAt')} />
          <TextField label={words.openedAt} optional type="datetime-local" {...field('transport.openedAt')} />
        </div>
        <TextareaField label={words.transportNote} optional {...field('transport.note')} />
      </div>
    </details>
  )
}
