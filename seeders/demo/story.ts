import type { Stage } from './stage'

/** A thread of the demo: it acts, and yields the instant at which it goes on. */
export type Story<T = void> = AsyncGenerator<Date, T, void>

/** Lets stories happen side by side in one time, each going on when its moment has come, until all have ended. */
export async function tellTogether(stage: Stage, stories: readonly Story[]): Promise<void> {
  const now = await stage.now()
  const waiting = stories.map((story) => ({ story, at: now }))
  while (waiting.length > 0) {
    const next = waiting.reduce((first, each) => (each.at < first.at ? each : first))
    await stage.goTo(next.at)
    const went = await next.story.next()
    if (went.done) waiting.splice(waiting.indexOf(next), 1)
    else next.at = went.value
  }
}
