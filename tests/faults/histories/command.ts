import type fc from 'fast-check'
import type { History } from './history'
import type { Model } from './model'

/** One thing that happens, told to the model as far as anybody was told; what holds always is looked at afterwards. */
export class Command implements fc.AsyncCommand<Model, History> {
  constructor(
    private readonly words: string,
    private readonly happen: (told: Model, history: History) => Promise<void>,
  ) {}

  check = () => true

  async run(told: Model, history: History): Promise<void> {
    await this.happen(told, history)
    await history.expectAlways(told)
  }

  toString = () => this.words
}
