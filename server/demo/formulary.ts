import type { AgentCode } from '../../shared/domain/formulary/agent.ts'
import type { Composition } from '../composition.ts'
import type { DemoActors } from './people.ts'

const daysFrom = (at: Date, days: number) =>
  new Date(at.getTime() + days * 86_400_000).toISOString().slice(0, 10)

interface DemoProduct {
  agent: AgentCode
  name: string
  form: 'liquid' | 'powder' | 'crystals'
  strength: { value: string; unit: string }
  basis: 'active' | 'product' | 'salt' | 'base'
  density?: { value: string; unit: string }
  lots: { number: string; expiresInDays: number }[]
}

/** Strengths are those of the labels in the treatments reference; names and lots are invented. */
const products: DemoProduct[] = [
  {
    agent: 'formalin',
    name: 'Formalin 37 %, drum of the treatment room',
    form: 'liquid',
    strength: { value: '37', unit: 'percent_w_w' },
    basis: 'active',
    density: { value: '1.08', unit: 'g/mL' },
    lots: [
      { number: 'FS-0091', expiresInDays: 410 },
      { number: 'FS-0078', expiresInDays: -20 },
    ],
  },
  {
    agent: 'copper-sulfate',
    name: 'Copper sulfate pentahydrate, fine crystals',
    form: 'crystals',
    strength: { value: '99', unit: 'percent_w_w' },
    basis: 'salt',
    lots: [{ number: 'CS-2411', expiresInDays: 470 }],
  },
  {
    agent: 'praziquantel',
    name: 'Praziquantel powder',
    form: 'powder',
    strength: { value: '99.0', unit: 'percent_w_w' },
    basis: 'active',
    lots: [{ number: 'PZ-0317', expiresInDays: 300 }],
  },
  {
    agent: 'hydrogen-peroxide',
    name: 'Hydrogen peroxide 35 % for fish',
    form: 'liquid',
    strength: { value: '396.1', unit: 'mg/mL' },
    basis: 'active',
    lots: [{ number: 'HP-7720', expiresInDays: 150 }],
  },
  {
    agent: 'sodium-chloride',
    name: 'Salt, food grade, without additives',
    form: 'crystals',
    strength: { value: '99.5', unit: 'percent_w_w' },
    basis: 'active',
    lots: [{ number: 'NA-1402', expiresInDays: 900 }],
  },
  {
    agent: 'chloramine-t',
    name: 'Chloramine-T trihydrate powder',
    form: 'powder',
    strength: { value: '100', unit: 'percent_w_w' },
    basis: 'salt',
    lots: [{ number: 'CT-0550', expiresInDays: 210 }],
  },
  {
    agent: 'tricaine',
    name: 'Tricaine methanesulfonate powder',
    form: 'powder',
    strength: { value: '100', unit: 'percent_w_w' },
    basis: 'salt',
    lots: [{ number: 'TM-0123', expiresInDays: 330 }],
  },
  {
    agent: 'enrofloxacin',
    name: 'Enrofloxacin 2.27 % for injection',
    form: 'liquid',
    strength: { value: '22.7', unit: 'mg/mL' },
    basis: 'base',
    lots: [{ number: 'EN-5106', expiresInDays: 260 }],
  },
  {
    agent: 'meloxicam',
    name: 'Meloxicam for injection',
    form: 'liquid',
    strength: { value: '5', unit: 'mg/mL' },
    basis: 'active',
    lots: [{ number: 'ML-0442', expiresInDays: 190 }],
  },
]

/** Products and lots of the practice scenario; expiry counts from the day of loading. */
export async function seedFormulary(
  { formulary, parts }: Composition,
  actors: DemoActors,
  today: Date,
): Promise<void> {
  const tech = { actor: actors.tech, requestId: 'demo' }
  const vet = { actor: actors.vet, requestId: 'demo' }
  for (const product of products) {
    const id = parts.ids.next()
    await formulary.service.enterProduct(tech, {
      id,
      agent: product.agent,
      productName: product.name,
      form: product.form,
      strength: product.strength,
      strengthBasis: product.basis,
      ...(product.density ? { density: product.density } : {}),
    })
    for (const lot of product.lots)
      await formulary.service.receiveLot(tech, id, {
        id: parts.ids.next(),
        lotNumber: lot.number,
        expiresOn: daysFrom(today, lot.expiresInDays),
        receivedOn: daysFrom(today, -120),
      })
  }
  const { lines } = await formulary.queries.formulary()
  const confirmed = lines.filter((line) =>
    ['formalin', 'copper-sulfate', 'praziquantel', 'meloxicam'].includes(line.agent),
  )
  for (const line of confirmed) await formulary.service.confirmDoseLine(vet, line.id, undefined)
}
