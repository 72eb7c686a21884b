/** Names a line across pictures and tables; P1(2) of two bands are two lines. */
export const lineKey = (line: { band: string, label: string }): string => `${line.band} ${line.label}`
