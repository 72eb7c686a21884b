export const themes = [
  { id: 'day', label: 'Day', icon: 'lucide:sun', title: 'Day: warm paper' },
  { id: 'night', label: 'Night', icon: 'lucide:moon', title: 'Night: blue-black' },
  { id: 'dome', label: 'Dome', icon: 'lucide:telescope', title: 'Dome: dim red for dark-adapted eyes' },
] as const
