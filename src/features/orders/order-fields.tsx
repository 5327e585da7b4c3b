import { useQuery } from '@tanstack/react-query'
import type { Product } from '../../../shared/contracts/formulary.contract.ts'
import type { OrderPreview } from '../../../shared/contracts/orders.contract.ts'
import { isGivenInWater } from '../../../shared/domain/formulary/agent.ts'
import { routeOfUse } from '../../../shared/domain/formulary/dose-line.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { agentNames, basisNames, waterKinds } from '../../../shared/messages/formulary.ts'
import { lotStateNames } from '../../../shared/messages/formulary-screens.ts'
import { orderFormWords as words } from '../../../shared/messages/order-form.ts'
import { figureChanged } from '../../../shared/messages/orders.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { Button } from '../../ui/button.tsx'
import { Combobox } from '../../ui/combobox.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { TextareaField } from '../../ui/textarea-field.tsx'
import { Tick } from '../../ui/tick.tsx'
import { AnimalChooser } from '../animals/index.ts'
import { EnclosureChooser } from '../enclosures/index.ts'
import { formularyQuery, rangeOfLine, useOfLine } from '../formulary/index.ts'
import type { OrderValues } from './order-form-model.ts'
import { doseOfEntered } from './order-parts.tsx'

export interface FieldsProps {
  values: OrderValues
  onChange: (changes: Partial<OrderValues>) => void
  /** What is wrong with a field, once it is to be shown. */
  wrong: (name: keyof OrderValues) => string | undefined
}

/** The strength on the label; of a product that somebody changed past the program no figure is shown. */
const strengthText = (product: Product) =>
  product.record === 'broken' ? words.notAsEntered : doseOfEntered(product.strength)

/** The product in full: drug, name, strength and what the strength is of. */
export const productText = (product: Product) =>
  words.productText({
    name: agentNames[product.agent],
    product: product.productName,
    strength: strengthText(product),
    basis: basisNames[product.strengthBasis],
  })

/** Where, whom, against what, with what: enclosure, animals, problem, product, lot, dose line. */
export function OrderFields({
  values,
  onChange,
  wrong,
  water,
}: FieldsProps & { water: OrderPreview['water'] | undefined }) {
  const { data } = useQuery(formularyQuery)
  const products = data?.products ?? []
  const product = products.find((one) => one.id === values.productId)
  const linesInForce = (data?.lines ?? []).filter((line) => line.state !== 'proposed')
  const lines = linesInForce.filter(
    (line) => line.agent === product?.agent && routeOfUse(line.use) === 'immersion',
  )
  const line = lines.find((one) => one.id === values.doseLineId)
  return (
    <>
      <EnclosureChooser
        id="enclosureId"
        label={words.enclosure}
        value={values.enclosureId}
        wrong={wrong('enclosureId')}
        // animals of another water are not in this one
        onChange={(enclosureId) => onChange({ enclosureId, animalIds: [] })}
      />
      <AnimalTicks
        values={values}
        onChange={onChange}
        water={values.enclosureId === null ? undefined : water}
      />
      <TextareaField
        id="problem"
        label={words.problem}
        hint={words.problemHint}
        rows={2}
        maxLength={500}
        value={values.problem}
        wrong={wrong('problem')}
        onChange={(event) => onChange({ problem: event.target.value })}
      />
      <Combobox
        id="productId"
        label={words.product}
        options={products
          .filter(
            (one) =>
              one.id === values.productId ||
              (one.inUse && one.record === 'intact' && isGivenInWater(one.agent, linesInForce)),
          )
          .map((one) => ({
            value: one.id,
            name: agentNames[one.agent],
            detail: `${one.productName}, ${strengthText(one)}`,
          }))}
        value={values.productId}
        hint={product ? productText(product) : undefined}
        wrong={
          product?.record === 'broken'
            ? figureChanged.products
            : product?.inUse === false
              ? words.notInUse
              : wrong('productId')
        }
        onChange={(productId) => onChange({ productId, lotId: null, doseLineId: null })}
      />
      {product ? (
        <>
          <SelectField
            id="lotId"
            label={words.lot}
            hint={words.lotHint}
            startsEmpty={false}
            options={[
              { value: '', label: words.noLot },
              ...product.lots.map((lot) => ({
                value: lot.id,
                label: words.lotText({
                  lot: lot.lotNumber,
                  expires: sayDate(lot.expiresOn),
                  state: lotStateNames[lot.state],
                }),
              })),
            ]}
            value={values.lotId ?? ''}
            onChange={(event) => onChange({ lotId: event.target.value || null })}
          />
          <SelectField
            id="doseLineId"
            label={words.line}
            startsEmpty={false}
            hint={
              line
                ? [
                    words.lineText({
                      use: useOfLine(line),
                      range: rangeOfLine(line),
                      basis: basisNames[line.basis],
                      water: waterKinds[line.water],
                    }),
                    ...(line.longestContactMinutes === null
                      ? []
                      : [words.lineLongest({ minutes: formatDose(line.longestContactMinutes, 'min').text })]),
                    words.lineSource(line),
                  ].join('; ')
                : words.lineHint
            }
            options={[
              { value: '', label: words.noLine },
              ...lines.map((one) => ({ value: one.id, label: `${useOfLine(one)}: ${rangeOfLine(one)}` })),
            ]}
            value={values.doseLineId ?? ''}
            onChange={(event) => onChange({ doseLineId: event.target.value || null })}
          />
        </>
      ) : null}
    </>
  )
}

/** Everybody in the connected water, to be ticked one by one or all at once; nobody is ticked beforehand. */
function AnimalTicks({
  values,
  onChange,
  water,
}: Pick<FieldsProps, 'values' | 'onChange'> & { water: OrderPreview['water'] | undefined }) {
  const animals = water?.animals ?? []
  const ticked = new Set(values.animalIds)
  return (
    <fieldset className="field" id="animalIds" tabIndex={-1}>
      <legend className="field-label">{words.animals}</legend>
      {!water ? <span className="hint">{words.animalsFirst}</span> : null}
      {water && animals.length === 0 ? <span className="hint">{words.noneThere}</span> : null}
      {animals.map((animal) => (
        <Tick
          key={animal.animalId}
          label={words.animal({ accession: animal.accession, name: animal.commonName })}
          hint={words.animalHint({ count: animal.countText, code: animal.enclosureCode })}
          checked={ticked.has(animal.animalId)}
          onChange={(event) =>
            onChange({
              animalIds: event.target.checked
                ? [...values.animalIds, animal.animalId]
                : values.animalIds.filter((id) => id !== animal.animalId),
            })
          }
        />
      ))}
      {animals.length > 1 ? (
        <span>
          <Button
            size="small"
            onClick={() => onChange({ animalIds: animals.map((animal) => animal.animalId) })}
          >
            {words.allOfThem}
          </Button>
        </span>
      ) : null}
      {water?.vessel ? (
        <AnimalChooser
          // empty again for the next one
          key={values.animalIds.length}
          label={words.bring}
          hint={words.bringHint}
          value={null}
          onChange={(id) => {
            if (id !== null && !ticked.has(id)) onChange({ animalIds: [...values.animalIds, id] })
          }}
        />
      ) : null}
      {animals.length > 0 ? <span className="hint">{words.sharesHint}</span> : null}
    </fieldset>
  )
}
