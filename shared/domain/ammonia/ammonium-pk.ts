const zeroCelsiusK = 273.15

/**
 * pKa of ammonium in fresh water: 0.09018 + 2729.92 ÷ T.
 *
 * @param temperatureC °C, 0…50
 * @source emerson-1975 · check value uia.fw17. One help page prints 2727.92: a misprint
 */
export function freshWaterPk(temperatureC: number): number {
  return 0.09018 + 2729.92 / (temperatureC + zeroCelsiusK)
}

/**
 * Stoichiometric pK of ammonium in brackish and sea water on the free scale of hydrogen ions.
 *
 * @param temperatureC  °C, −2…40
 * @param salinityPss78 0…40
 * @source clegg-whitfield-1995 · check values uia.cw05 to uia.cw08
 */
export function freeScalePk(temperatureC: number, salinityPss78: number): number {
  const t = temperatureC + zeroCelsiusK
  const s = salinityPss78
  return (
    9.244605 -
    2729.33 * (1 / 298.15 - 1 / t) +
    (0.0500616 - 9.412696 / t - 2.029559e-7 * t ** 2) * s ** 0.5 +
    (-0.0142372 + 1.46041e-5 * t + 3.730005 / t) * s +
    (7.14045e-5 - 0.0229021 / t) * s ** 2 +
    (-5.521278e-7 + 1.95413e-4 / t) * s ** 3
  )
}

/**
 * Stoichiometric pK of ammonium in brackish and sea water on the total scale of hydrogen ions.
 *
 * @param temperatureC  °C, −2…40
 * @param salinityPss78 0…40
 * @source clegg-whitfield-1995 · check values uia.cw01 to uia.cw04
 */
export function totalScalePk(temperatureC: number, salinityPss78: number): number {
  const t = temperatureC + zeroCelsiusK
  const s = salinityPss78
  return (
    9.244605 -
    2729.33 * (1 / 298.15 - 1 / t) +
    (0.04203362 - 11.24742 / t) * s ** 0.25 +
    (-13.6416 + 1.176949 * t ** 0.5 - 0.02860785 * t + 545.4834 / t) * s ** 0.5 +
    (-0.1462507 + 0.0090226468 * t ** 0.5 - 0.0001471361 * t + 10.5425 / t) * s ** 1.5 +
    (0.004669309 - 0.0001691742 * t ** 0.5 - 0.5677934 / t) * s ** 2 +
    (-2.354039e-5 + 0.009698623 / t) * s ** 2.5
  )
}
