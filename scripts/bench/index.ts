import { benchCosts } from './core-costs'
import { benchDemand } from './core-demand'
import { benchHttp } from './http'

// Everything that is measured, as one table: times of the core beside a naive way, requests beside a bare server. What
// counts are the ratios; the rest depends on the machine.
const parts = [
  { name: 'Demand and schedule', measure: benchDemand },
  { name: 'Costs and addresses', measure: benchCosts },
  { name: 'Over HTTP', measure: benchHttp },
]
for (const { name, measure } of parts) {
  console.log(`\n${name}`)
  for (const each of await measure()) {
    const value = each.value.toFixed(each.value < 10 ? 2 : 0).padStart(8)
    console.log(`  ${each.name.padEnd(66)} ${value} ${each.unit}`)
  }
}
