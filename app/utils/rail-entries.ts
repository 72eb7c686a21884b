/** The rail, in its order; `key` is pressed after `g`. */
export const railEntries = [
  { to: '/', label: 'Desk', icon: 'desk', key: 'd' },
  { to: '/campaigns', label: 'Campaigns', icon: 'campaigns', key: 'c' },
  { to: '/submit', label: 'Submit', icon: 'submit', key: 's' },
  { to: '/retrievals', label: 'Retrievals', icon: 'retrievals', key: 'r' },
  { to: '/line-lists', label: 'Line lists', icon: 'lists', key: 'l' },
] as const

const adminEntry = { to: '/admin', label: 'Admin', icon: 'admin', key: 'a' } as const

/** Administrators have one more. */
export const railEntriesFor = (user: { isAdministrator: boolean } | null) => user?.isAdministrator ? [...railEntries, adminEntry] : [...railEntries]
