import * as afterPosting from '@/lib/messages/mails/after-posting'
import * as balance from '@/lib/messages/mails/balance'
import * as deposits from '@/lib/messages/mails/deposits'
import * as interest from '@/lib/messages/mails/interest'
import * as people from '@/lib/messages/mails/people'
import * as run from '@/lib/messages/mails/run'
import * as words from '@/lib/messages/mails/words'

/** Every sentence of the mails, in English. Values come in formatted; plurals are chosen here. */
export const mailWords = {
  ...words,
  ...interest,
  ...deposits,
  ...run,
  ...balance,
  ...afterPosting,
  ...people,
}
