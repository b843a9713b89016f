/** Refusals of signing in and of mails' links. */
export const signIn: Record<string, string> = {
  token_unknown: 'This link does not work. It may have been used already; ask for a new one.',
  token_expired: 'This link has expired. Ask for a new one.',
  token_used: 'This link has been used, and what it was for has changed since. Nothing was changed now.',
  wrong_code: 'This code does not match. Check it and try again.',
  code_used: 'This code was used already. Wait for the next one.',
}
