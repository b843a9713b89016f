import { general } from './general'
import { money } from './money'
import { post } from './post'
import { runs } from './runs'
import { signIn } from './sign-in'
import { signups } from './signups'
import { workshops } from './workshops'

const sentences: Record<string, string> = {
  ...general,
  ...signIn,
  ...signups,
  ...workshops,
  ...runs,
  ...money,
  ...post,
}

/** The sentence a person reads for a refusal; each says what to do. Services' reasons stand in these files by domain. */
export function reasonWords(reason: string): string {
  return sentences[reason] ?? general.refused
}

/** Whether a reason has a sentence of its own; a test asks this of every reason the services can give. */
export const hasWords = (reason: string): boolean => reason in sentences
