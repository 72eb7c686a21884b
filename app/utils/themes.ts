export const themes = [
  { id: 'day', label: 'Day', title: 'Day: warm paper' },
  { id: 'night', label: 'Night', title: 'Night: blue-black' },
  { id: 'dome', label: 'Dome', title: 'Dome: dim red for dark-adapted eyes' },
] as const
