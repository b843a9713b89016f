/** The role a membership gives a person in one workshop. */
export type Role = 'owner' | 'bench' | 'packer'

/**
 * Whom a deed is open to: anybody; anybody signed in; the person whom the row is about (`self`);
 * a member of the row's workshop in a role; the host of the deployment.
 */
export type Audience = 'anybody' | 'person' | 'self' | Role | 'host'

/** Who may do a deed, and whether it moves money in bulk or for good, which asks for a fresh second factor. */
export type DeedRule = { readonly for: readonly Audience[]; readonly secondFactor?: true }
