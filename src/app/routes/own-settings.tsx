import { frameWords } from '../../../shared/messages/frame.ts'
import { ownSettingsWords } from '../../../shared/messages/own-settings.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { OwnLicences } from '../../features/licences/index.ts'
import { useMe } from '../../lib/me.ts'
import { useSetPreference } from '../../lib/preferences.ts'
import type { PreferenceName } from '../../lib/preferences.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { chooseTheme, themeChoices, useThemeChoice } from '../../lib/theme.ts'
import { Cartouche } from '../../ui/cartouche.tsx'
import { ChoiceField } from '../../ui/choice-field.tsx'
import { SelectField } from '../../ui/select-field.tsx'
import { Area, Sheet } from '../../ui/sheet.tsx'
import { Tick } from '../../ui/tick.tsx'
import { WrongSummary } from '../../ui/wrong-summary.tsx'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

const unitChoices: { name: PreferenceName; label: () => string; units: UnitCode[] }[] = [
  { name: 'volumeUnit', label: () => ownSettingsWords.volume, units: ['L', 'm3', 'gal_us'] },
  { name: 'massUnit', label: () => ownSettingsWords.mass, units: ['kg', 'g', 'lb'] },
  { name: 'temperatureUnit', label: () => ownSettingsWords.temperature, units: ['degC', 'degF'] },
  { name: 'lengthUnit', label: () => ownSettingsWords.length, units: ['m', 'cm', 'ft', 'in'] },
]

/** What a person chooses for themselves: light, units to read in, keys; and which licences are entered for them. */
export function Component() {
  useSheetTitle(ownSettingsWords.title)
  const me = useMe()
  const theme = useThemeChoice()
  const keep = useSetPreference()
  const set = (name: PreferenceName, value: string) => keep.mutate({ name, value })

  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche place={me.printedName} title={ownSettingsWords.title} source={ownSettingsWords.source} />
        <OwnLicences />
      </Area>
      <Area className="pane stack gap-6">
        <WrongSummary fields={[]} general={isProblem(keep.error) ? keep.error.says : undefined} />
        <ChoiceField
          label={ownSettingsWords.light}
          hint={ownSettingsWords.lightHint}
          segments={themeChoices.map((value) => ({ value, label: frameWords[value] }))}
          value={theme}
          onChange={(value) => {
            chooseTheme(value, me.id)
            set('theme', value)
          }}
        />
        <section className="stack">
          <h2 className="t-head">{ownSettingsWords.units}</h2>
          <div className="grid grid-cols-2 gap-3 max-w-[420px]">
            {unitChoices.map((choice) => (
              <SelectField
                key={choice.name}
                label={choice.label()}
                startsEmpty={false}
                options={[
                  { value: '', label: ownSettingsWords.facilityUnit },
                  ...choice.units.map((unit) => ({ value: unit, label: unitOf(unit).symbol })),
                ]}
                value={me.preferences[choice.name] ?? ''}
                onChange={(event) => set(choice.name, event.target.value)}
              />
            ))}
          </div>
          <p className="hint">{ownSettingsWords.unitsHint}</p>
        </section>
        <section className="stack">
          <h2 className="t-head">{ownSettingsWords.keys}</h2>
          <Tick
            label={ownSettingsWords.keysLabel}
            hint={ownSettingsWords.keysHint}
            checked={me.preferences.singleKeys !== 'off'}
            onChange={(event) => set('singleKeys', event.target.checked ? 'on' : 'off')}
          />
        </section>
      </Area>
    </Sheet>
  )
}
