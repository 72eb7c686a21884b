/** The rail, in its order; `key` is pressed after `g`. */
export const railEntries = [
  { to: '/', label: 'Desk', icon: 'lucide:house', key: 'd' },
  { to: '/campaigns', label: 'Campaigns', icon: 'lucide:mountain', key: 'c' },
  { to: '/submit', label: 'Submit', icon: 'lucide:upload', key: 's' },
  { to: '/retrievals', label: 'Retrievals', icon: 'lucide:thermometer', key: 'r' },
  { to: '/line-lists', label: 'Line lists', icon: 'lucide:list-tree', key: 'l' },
] as const
