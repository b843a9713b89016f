/** Over a refusal that stands on a page by itself. */
export const refusedTitle = 'Not done'

/** Refusals any page may meet. */
export const general = {
  refused: 'This is not possible in the present state. Load the page again to see what has changed.',
  unreadable: 'The request could not be read. Check that it is complete and try again.',
  not_signed_in: 'Sign in first, then try again.',
  wrong_origin: 'This request came from another site and was not carried out.',
  not_found: 'There is nothing here that you can see.',
  forbidden: 'There is nothing here that you can see.',
  method_not_allowed: 'This address does not answer that kind of request.',
  too_large: 'This is too large to be accepted. Send less at once.',
  unsupported_type: 'Send this as JSON or as a form.',
  invalid: 'Some fields need another look.',
  too_many: 'Too many tries in a short time. Wait a minute, then try again.',
  busy: 'The server is busy. Try again in a few seconds.',
  other_body_for_key: 'This key was already used for a different request.',
  still_running: 'The same request is still being worked on. Wait a moment, then load the page.',
  second_factor: 'Enter a fresh one-time code first; this deed moves money.',
  bug: 'Something went wrong on our side. Nothing you typed was sent twice; try again, or write to us with the number below.',
}
