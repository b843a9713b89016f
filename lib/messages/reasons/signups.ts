/** Refusals of what follows from interest. */
export const signups: Record<string, string> = {
  unknown_link: 'This link does not work. Open it from the mail again; it may have been cut off.',
}
