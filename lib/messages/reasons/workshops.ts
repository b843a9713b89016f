/** Refusals of the services under workshops, modules, settings and members. */
export const workshops: Record<string, string> = {
  provider_unreachable: 'The payment provider did not answer. Nothing was changed; try again in a minute.',
}
