import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { anEnclosure, aValve, aWaterBody } from '../builders/a-water.ts'
import { launchChromium } from '../support/chromium.ts'
import { deskSize, expectSound, openSignedIn, phoneSize, picture, refusals } from '../support/journey.ts'
import { startServedApp } from '../support/served-app.ts'
import type { ServedApp } from '../support/served-app.ts'

let browser: Browser
let app: ServedApp

beforeAll(async () => {
  app = await startServedApp()
  await app.as('keeper')
  await app.as('technician')
  await app.person({
    email: 'second@harrow-point.example',
    printedName: 'Second technician',
    roles: ['technician'],
  })
  for (const n of ['3', '5']) {
    const tank = await anEnclosure(app, `QT-${n}`, { area: 'Quarantine wing', name: `System ${n}` })
    const sump = await aWaterBody(app, `QS-${n}`)
    await aValve(app, `V-${n}`, [tank.waterBodyId, sump])
    const spare = await anEnclosure(app, `QT-${n}0`, { area: 'Quarantine wing', name: `Spare ${n}` })
    await aValve(app, `V-${n}0`, [sump, spare.waterBodyId], false)
    const technician = await app.as('technician')
    const wanted = { unit: 'mg/L', outerLow: '4.5', innerLow: '5.5' }
    await technician.agent
      .post(`/api/enclosures/QT-${n}/ranges`)
      .send({ id: app.nextId(), parameter: 'dissolved-oxygen', ...wanted })
      .expect(201)
  }
  browser = await launchChromium()
}, 180_000)
afterAll(async () => {
  await browser.close()
  await app.stop()
})

const expectedErrors = refusals(422)
const desk = { ...deskSize, expectedErrors }
const phone = { ...phoneSize, expectedErrors }
const signedIn = (who: string, size: typeof desk, at: string): Promise<Page> =>
  openSignedIn(browser, app, who, at, size)

describe.each([
  { size: desk, code: 'QT-3', sump: 'QS-3', valve: 'V-30' },
  { size: phone, code: 'QT-5', sump: 'QS-5', valve: 'V-50' },
])('water at $size.width px', ({ size, code, sump, valve }) => {
  it('is measured by a keeper, who sees at once what lies outside what is wanted', async () => {
    const page = await signedIn('keeper', size, '/water')
    await page.getByRole('searchbox', { name: /Find by code/ }).fill(code)
    await page.keyboard.press('Enter')
    await page.waitForURL(/q=QT/)
    await expectSound(page, 'list of water')
    await page.getByRole('link', { name: code, exact: true }).click()
    await page.getByText('No dose can be worked out from this volume now').waitFor()
    await page.getByRole('link', { name: 'Add readings' }).first().click()

    await page.getByRole('textbox', { name: 'Dissolved oxygen' }).fill('4.40')
    await page.getByText(/far below: past the outer limit of 4\.5\s?mg\/L/).waitFor()
    await page
      .getByRole('combobox', { name: 'Measure another parameter' })
      .selectOption({ label: 'Temperature' })
    await page.getByRole('textbox', { name: 'Temperature' }).fill('256')
    await page.getByRole('textbox', { name: 'Instrument or kit' }).fill('Meter 4')
    await page.getByText(/temperature.*60\s?°C/i).waitFor()
    await expectSound(page, 'form of readings')
    await page.getByRole('textbox', { name: 'Temperature' }).fill('25.6')
    await page.getByRole('button', { name: /Record 2\sreadings/ }).click()

    await page.getByRole('heading', { name: code, level: 1 }).waitFor()
    const oxygen = page.getByRole('figure').filter({ hasText: 'Dissolved oxygen' })
    await oxygen.getByText('4.40').waitFor()
    expect(await oxygen.textContent()).toContain('far below, past 4.5\u00a0mg/L')
    await expectSound(page, 'enclosure')

    await page.getByRole('link', { name: 'As a table' }).click()
    const row = page.getByRole('row').filter({ hasText: 'Temperature' })
    await row.getByRole('button', { name: /Strike through/ }).click()
    await page.getByRole('textbox', { name: 'Reason' }).fill('another tank')
    await expectSound(page, 'dialog of striking through')
    await page.getByRole('dialog').getByRole('button', { name: 'Strike through' }).click()
    await row.waitFor({ state: 'detached' })
    // on a phone the filters are folded away above the rows
    if (size === phone) await page.getByText('Filters', { exact: true }).click()
    // ticked in the very event of the click: it does not wait until the list has been read again
    const box = page.getByRole('checkbox', { name: 'Show those struck through' })
    const isTickedAtOnce = await box.evaluate((input: HTMLInputElement) => {
      input.click()
      return input.checked
    })
    expect(isTickedAtOnce).toBe(true)
    await page.getByText('Filters, 1 in use').waitFor()
    await page.getByText(/another tank/).waitFor()
    await expectSound(page, 'list of readings')
  })

  it('has a volume that one person measures and another confirms; an opened valve takes it away', async () => {
    const page = await signedIn('technician', size, `/enclosures/${code}/volume`)
    const part = (name: string) => page.getByRole('group', { name })
    const measure = async (name: string, values: [string, string, string]) => {
      await part(name).getByRole('textbox', { name: 'Inside length' }).fill(values[0])
      await part(name).getByRole('textbox', { name: 'Inside width' }).fill(values[1])
      await part(name).getByRole('textbox', { name: 'Depth of the water' }).fill(values[2])
    }
    await measure(code, ['2.40', '1.20', '68'])
    await measure(sump, ['1.10', '0.60', '0.40'])
    await page
      .getByText(/depth.*15/i)
      .first()
      .waitFor()
    await expectSound(page, 'form of a volume, a slip in the depth')
    await part(code).getByRole('textbox', { name: 'Depth of the water' }).fill('0.68')
    await page.getByRole('radio', { name: 'measured' }).click()
    await page.getByRole('textbox', { name: 'Displaced' }).fill('41')
    // 1,958.4 + 264 − 41 = 2,181.4 L, worked by hand; 1.8 % of it is 39 L, so tens are shown
    await page.getByText('2,181.4\u00a0L', { exact: true }).waitFor()
    await expectSound(page, 'form of a volume')
    await page.getByRole('button', { name: 'Record the volume' }).click()
    await page.getByRole('heading', { name: 'Volumes' }).waitFor()
    await page.getByText('waits for a second person', { exact: true }).waitFor()
    const own = page.getByRole('button', { name: 'Confirm' })
    expect(await own.getAttribute('aria-disabled')).toBe('true')
    expect(await page.getByText('You determined it; a colleague confirms it').isVisible()).toBe(true)

    const colleague = await signedIn('second', size, `/enclosures/${code}/volumes`)
    await colleague.getByRole('button', { name: 'Confirm' }).click()
    await expectSound(colleague, 'dialog of confirming')
    await colleague.getByRole('dialog').getByRole('button', { name: 'Confirm' }).click()
    await colleague.getByText('in force now').waitFor()
    await expectSound(colleague, 'list of volumes')

    await colleague.goto(`${app.url}/enclosures/${code}`)
    await colleague.locator('.net-volume [data-quantity=volume]').filter({ hasText: '2,180' }).waitFor()
    expect(await colleague.getByText(/Confirmed on .*, Second technician/).isVisible()).toBe(true)
    await colleague.getByRole('button', { name: `Open ${valve}` }).click()
    await colleague.getByText(/share one water: animals, drugs and disease pass/).waitFor()
    await expectSound(colleague, 'dialog of a valve')
    await colleague.getByRole('dialog').getByRole('button', { name: 'Open', exact: true }).click()
    await colleague.getByText('No dose can be worked out from this volume now').waitFor()
    await expectSound(colleague, 'enclosure whose volume does not hold')
  })

  it('changes by events that are recorded, and places are entered with what is missing said', async () => {
    const page = await signedIn('technician', size, `/enclosures/${code}`)
    await page.getByRole('button', { name: 'Record an event' }).first().click()
    const dialog = page.getByRole('dialog')
    await dialog.getByRole('combobox', { name: 'What was done' }).selectOption({ label: 'water change' })
    await dialog.getByRole('radio', { name: 'by share' }).click()
    await dialog.getByRole('textbox', { name: 'Share of the water' }).fill('130')
    await dialog.getByRole('button', { name: 'Record' }).click()
    await dialog
      .getByText(/at most 100|100/)
      .first()
      .waitFor()
    await expectSound(page, 'dialog of an event refused')
    await dialog.getByRole('textbox', { name: 'Share of the water' }).fill('15')
    await dialog.getByRole('button', { name: 'Record' }).click()
    await page.getByText('15\u00a0% of the water').waitFor()

    await page.goto(`${app.url}/water/new`)
    await page.getByRole('textbox', { name: 'Code' }).fill(`${code}-T`)
    await page.getByRole('checkbox', { name: /treatment vessel/ }).check()
    await page.getByRole('button', { name: 'Enter the enclosure' }).click()
    await page.getByText('Type a name').waitFor()
    await expectSound(page, 'form of an enclosure with faults')
    await page.getByRole('textbox', { name: 'Name' }).fill('Tub')
    await page.getByRole('combobox', { name: 'Kind of place' }).selectOption({ label: 'tub' })
    await page.getByRole('textbox', { name: 'Part of the house' }).fill('Treatment room')
    await page.getByRole('textbox', { name: 'Fill mark' }).fill('red line')
    await page.getByRole('textbox', { name: 'Water to the mark' }).fill('60')
    await page.getByRole('button', { name: 'Enter the enclosure' }).click()
    await page.getByRole('heading', { name: `${code}-T`, level: 1 }).waitFor()
    await page.getByText('Fill to the red line: 60\u00a0L.').waitFor()

    await page.goto(`${app.url}/water/map`)
    await page.getByRole('heading', { name: 'Valves and bodies' }).waitFor()
    await page.getByText(`Sump ${sump}`).first().waitFor()
    await expectSound(page, 'map of the water')
  })
})

it('says on a phone that it is done where no button of the next form is covered', async () => {
  const page = await signedIn('keeper', phone, '/enclosures/QT-5/measure')
  await page.getByRole('textbox', { name: 'Dissolved oxygen' }).fill('6.90')
  await page.getByRole('textbox', { name: 'Instrument or kit' }).fill('Meter 4')
  await page.getByRole('button', { name: /Record 1\sreading/ }).click()
  const toast = page.locator('.toast')
  await toast.waitFor()
  await page.getByRole('link', { name: 'Add readings' }).first().click()
  await page.getByRole('textbox', { name: 'Dissolved oxygen' }).fill('6.80')
  const submit = page.getByRole('button', { name: /Record 1\sreading/ })
  // at the top of the form nothing that can be pressed lies below it
  const covered = await toast.evaluate((one) => {
    const of = (each: Element) => each.getBoundingClientRect()
    const it = of(one)
    return [
      ...document.querySelectorAll('main button, main a, main input, main select, header button, header a'),
    ]
      .filter((each) => !one.contains(each))
      .filter((each) => {
        const { left, right, top, bottom } = of(each)
        return right > it.left && left < it.right && bottom > it.top && top < it.bottom
      })
      .map((each) => each.outerHTML.slice(0, 120))
  })
  await picture(page, 'toast')
  expect(covered).toEqual([])
  await submit.scrollIntoViewIfNeeded()
  const [a, b] = [await toast.boundingBox(), await submit.boundingBox()]
  expect(a && b && (a.y + a.height <= b.y || b.y + b.height <= a.y)).toBe(true)
})
