/** Refusals of the services under workshops, modules, settings and members. */
export const workshops: Record<string, string> = {
  provider_unreachable: 'The payment provider did not answer. Nothing was changed; try again in a minute.',
  workshop_pending:
    'The host of this site has not opened your workshop yet. Go on preparing; you can publish once it is open.',
  workshop_suspended:
    'This workshop is suspended. Write to the host of this site; nothing new can be published.',
  one_line_missing: 'Say in one line what the module is, under Facts, then publish.',
  cautions_missing: 'Write the cautions a buyer must read, under Facts, then publish.',
  offers_missing: 'Enter at least one offer, then publish.',
  postal_address_missing:
    'Enter the postal address buyers can write to, under Settings, then publish: it stands on the page.',
  run_in_progress:
    'A run of this module takes deposits or is being built. Archive it when the run has ended.',
  zone_in_use: 'Parcels have gone out by this zone’s services. Change its countries instead of removing it.',
  already_recorded: 'A good unit of this revision is on record already.',
  already_mended: 'This lesson is settled already. Load the page to see how.',
  offers_first: 'Enter the offers first; the plan is made for them.',
  last_owner: 'A workshop needs an owner. Invite another one first.',
  already_member: 'This person already works for the workshop in that role.',
  other_address: 'This invitation was sent to another address. Sign in with that one to accept it.',
  import_has_mistakes: 'Some lines cannot be read yet. Mend them first; nothing was saved.',
}
