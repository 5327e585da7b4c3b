import { drugInFeed, type DrugInFeed } from '../../../shared/domain/feed/drug-in-feed.ts'
import { gelBatchDays, gelBatchDrug } from '../../../shared/domain/feed/gel-batch.ts'
import { groupBiomass } from '../../../shared/domain/feed/group-biomass.ts'
import { drugPerDay, feedPerDay } from '../../../shared/domain/feed/per-day.ts'
import { premixKgPerTonne } from '../../../shared/domain/feed/premix.ts'
import type { Answer, Inputs, Runner } from '../published-case.ts'
import { figure, numberOf } from './reading-inputs.ts'

const names = {
  doseMgPerKg: 'dose_mg_per_kg_bw_day',
  feedingRatePercentBw: 'feeding_rate_percent_bw',
  biomassKg: 'biomass_kg',
}
const dailyDose = (inputs: Inputs) => ({
  doseMgPerKg: numberOf(inputs, 'dose_mg_per_kg_bw_day'),
  feedingRatePercentBw: numberOf(inputs, 'feeding_rate_percent_bw'),
})
const strengthIn = (inputs: Inputs, pick: keyof DrugInFeed): Answer =>
  figure(drugInFeed(dailyDose(inputs)), (value) => value[pick], names)

export const injectionFeedRunners: Readonly<Record<string, Runner>> = {
  group_biomass_kg: (inputs) =>
    figure(
      groupBiomass({
        count: numberOf(inputs, 'count'),
        meanWeightG: numberOf(inputs, 'mean_weight_g'),
        feedGivenKg: numberOf(inputs, 'feed_given_kg'),
        feedConversion: numberOf(inputs, 'fcr'),
      }),
      ({ biomassKg }) => biomassKg,
      {},
    ),
  drug_per_day_mg: (inputs) =>
    figure(
      drugPerDay({
        biomassKg: numberOf(inputs, 'biomass_kg'),
        doseMgPerKg: numberOf(inputs, 'dose_mg_per_kg'),
      }),
      Number,
      names,
    ),
  feed_per_day_kg: (inputs) =>
    figure(
      feedPerDay({
        biomassKg: numberOf(inputs, 'biomass_kg'),
        feedingRatePercentBw: numberOf(inputs, 'feeding_rate_percent_bw'),
      }),
      Number,
      names,
    ),
  drug_concentration_in_feed_mg_per_kg: (inputs) => strengthIn(inputs, 'mgPerKg'),
  drug_concentration_in_feed_g_per_short_ton: (inputs) => strengthIn(inputs, 'gPerShortTon'),
  premix_kg_per_tonne: (inputs) =>
    figure(
      premixKgPerTonne({
        targetGPerTonne: numberOf(inputs, 'target_g_active_per_tonne'),
        premixPercentWw: numberOf(inputs, 'premix_percent_w_w'),
      }),
      Number,
      {},
    ),
  gel_batch_drug_mg: (inputs) =>
    figure(gelBatchDrug({ ...dailyDose(inputs), batchG: numberOf(inputs, 'batch_mass_g') }), Number, names),
  gel_batch_fish_days: (inputs) =>
    figure(
      gelBatchDays({
        batchG: numberOf(inputs, 'batch_mass_g'),
        feedingRatePercentBw: numberOf(inputs, 'feeding_rate_percent_bw'),
        biomassKg: numberOf(inputs, 'biomass_kg'),
      }),
      Number,
      names,
    ),
}
