import { useQuery } from '@tanstack/react-query'
import { isGivenByWeight } from '../../../shared/domain/formulary/agent.ts'
import { injectionPlaces, routesByWeight } from '../../../shared/domain/orders/order-route.ts'
import { concentrationBases } from '../../../shared/domain/units/basis.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { agentNames, basisNames } from '../../../shared/messages/formulary.ts'
import { weightFormWords as words } from '../../../shared/messages/weight-form.ts'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { Combobox } from '../../ui/combobox.tsx'
import { QuantityField } from '../../ui/quantity-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { AnimalChooser } from '../animals/index.ts'
import { formularyQuery } from '../formulary/index.ts'
import { productText } from './order-fields.tsx'
import { doseOfEntered } from './order-parts.tsx'
import type { WeightValues } from './weight-form-model.ts'

const unitsOf = (units: readonly UnitCode[]) => units.map((unit) => ({ unit, label: unitOf(unit).symbol }))
const targetUnits = unitsOf(['mg/kg', 'ug/kg'])
const divisionUnits = unitsOf(['mL', 'uL', 'g', 'mg'])
const volumeUnits = unitsOf(['mL', 'uL'])

/** Whom, how, with what and how much: in the order in which a dose is written. */
export function WeightFields({
  values,
  onChange,
  wrong,
}: {
  values: WeightValues
  onChange: (changes: Partial<WeightValues>) => void
  /** What the server refuses of a field. */
  wrong: (name: string) => string | undefined
}) {
  const { data } = useQuery(formularyQuery)
  const { route } = values
  const products = (data?.products ?? []).filter(
    (one) => route !== null && one.inUse && one.record === 'intact' && isGivenByWeight(one.agent, route),
  )
  const product = products.find((one) => one.id === values.productId)
  return (
    <>
      <AnimalChooser
        id="animalId"
        label={words.animal}
        value={values.animalId}
        wrong={wrong('animalId')}
        onChange={(animalId) => onChange({ animalId })}
      />
      <ChoiceField
        label={words.route}
        segments={routesByWeight.map((value) => ({ value, label: words[value] }))}
        value={route}
        // another route has other products
        onChange={(next) => onChange({ route: next, productId: null })}
      />
      {route === 'injection' ? (
        <SelectField
          id="place"
          label={words.place}
          options={injectionPlaces.map((value) => ({ value, label: words[value] }))}
          value={values.place ?? ''}
          onChange={(event) => onChange({ place: (event.target.value || null) as WeightValues['place'] })}
        />
      ) : null}
      {route !== null ? (
        <Combobox
          id="productId"
          label={words.product}
          options={products.map((one) => ({
            value: one.id,
            name: agentNames[one.agent],
            detail: `${one.productName}, ${doseOfEntered(one.strength)}`,
          }))}
          value={values.productId}
          hint={data && products.length === 0 ? words.noProducts : product ? productText(product) : undefined}
          wrong={wrong('productId')}
          onChange={(productId) => onChange({ productId })}
        />
      ) : null}
      <QuantityField
        id="target"
        label={words.target}
        hint={words.targetHint}
        quantity={values.target}
        units={targetUnits}
        wrong={wrong('target')}
        onChange={(target) => onChange({ target })}
      />
      <SelectField
        id="basis"
        label={words.basis}
        options={concentrationBases.map((value) => ({ value, label: basisNames[value] }))}
        value={values.basis ?? ''}
        wrong={wrong('basis')}
        onChange={(event) => onChange({ basis: (event.target.value || null) as WeightValues['basis'] })}
      />
      <QuantityField
        id="division"
        label={words.division}
        quantity={values.division}
        units={divisionUnits}
        wrong={wrong('division')}
        onChange={(division) => onChange({ division })}
      />
      {route === 'injection' ? (
        <QuantityField
          id="mostPerPlace"
          label={words.mostPerPlace}
          hint={words.mostPerPlaceHint}
          optional
          quantity={values.mostPerPlace}
          units={volumeUnits}
          wrong={wrong('mostPerPlace')}
          onChange={(mostPerPlace) => onChange({ mostPerPlace })}
        />
      ) : null}
    </>
  )
}
