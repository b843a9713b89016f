import { forecastOf, type UnitsForecast } from './units-forecast'

/**
 * The forecast of a sum of counts that have nothing to do with one another: sign-ups and newcomers, say.
 * Accuracy: relative error of each chance about 1e-16 times the shorter length.
 * Source: convolution, by its definition.
 * Cost: O(length · length).
 * @example together([forecastOf(new Float64Array([0.5, 0.5])), forecastOf(new Float64Array([0.5, 0.5]))]).atLeast(1)  // → 0.75
 */
export function together(forecasts: readonly UnitsForecast[]): UnitsForecast {
  let pmf: Float64Array = new Float64Array([1])
  for (const { pmf: next } of forecasts) {
    const sum = new Float64Array(pmf.length + next.length - 1)
    for (let i = 0; i < pmf.length; i += 1) {
      const chance = pmf[i] as number
      if (chance === 0) continue
      for (let k = 0; k < next.length; k += 1)
        sum[i + k] = (sum[i + k] as number) + chance * (next[k] as number)
    }
    pmf = sum
  }
  const mean = forecasts.reduce((sum, each) => sum + each.mean, 0)
  const sd = Math.sqrt(forecasts.reduce((sum, each) => sum + each.sd ** 2, 0))
  return forecastOf(pmf, { mean, sd })
}
