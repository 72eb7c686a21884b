/**
 * The few icons of the rail and of buttons, as paths on a 24 x 24 field: from Lucide (https://lucide.dev, ISC licence).
 * They stand here so that they are drawn at once, on the server as in the browser.
 */
export const icons = {
  desk: 'M15 21v-8a1 1 0 0 0-1-1h-4a1 1 0 0 0-1 1v8 M3 10a2 2 0 0 1 .709-1.528l7-6a2 2 0 0 1 2.582 0l7 6A2 2 0 0 1 21 10v9a2 2 0 0 1-2 2H5a2 2 0 0 1-2-2z',
  campaigns: 'M8 3l4 8l5-5l5 15H2z',
  submit: 'M12 3v12m5-7l-5-5l-5 5m14 7v4a2 2 0 0 1-2 2H5a2 2 0 0 1-2-2v-4',
  retrievals: 'M14 4v10.54a4 4 0 1 1-4 0V4a2 2 0 0 1 4 0',
  lists: 'M8 5h13m-8 7h8m-8 7h8M3 10a2 2 0 0 0 2 2h3 M3 5v12a2 2 0 0 0 2 2h3',
  admin: 'M20 13c0 5-3.5 7.5-7.66 8.95a1 1 0 0 1-.67-.01C7.5 20.5 4 18 4 13V6a1 1 0 0 1 1-1c2 0 4.5-1.2 6.24-2.72a1.17 1.17 0 0 1 1.52 0C14.51 3.81 17 5 19 5a1 1 0 0 1 1 1z',
  account: 'M20 21a8 8 0 0 0-16 0 M7 8a5 5 0 1 0 10 0a5 5 0 1 0 -10 0',
  day: 'M12 2v2m0 16v2M4.93 4.93l1.41 1.41m11.32 11.32l1.41 1.41M2 12h2m16 0h2M6.34 17.66l-1.41 1.41M19.07 4.93l-1.41 1.41 M8 12a4 4 0 1 0 8 0a4 4 0 1 0 -8 0',
  night: 'M20.985 12.486a9 9 0 1 1-9.473-9.472c.405-.022.617.46.402.803a6 6 0 0 0 8.268 8.268c.344-.215.825-.004.803.401',
  dome: 'M10.065 12.493l-6.18 1.318a.934.934 0 0 1-1.108-.702l-.537-2.15a1.07 1.07 0 0 1 .691-1.265l13.504-4.44m-2.875 6.493l4.332-.924M16 21l-3.105-6.21 M16.485 5.94a2 2 0 0 1 1.455-2.425l1.09-.272a1 1 0 0 1 1.212.727l1.515 6.06a1 1 0 0 1-.727 1.213l-1.09.272a2 2 0 0 1-2.425-1.455zM6.158 8.633l1.114 4.456M8 21l3.105-6.21 M10 13a2 2 0 1 0 4 0a2 2 0 1 0 -4 0',
  download: 'M12 15V3m9 12v4a2 2 0 0 1-2 2H5a2 2 0 0 1-2-2v-4 M7 10l5 5l5-5',
} as const
export type IconName = keyof typeof icons
