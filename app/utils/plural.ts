/** "1 line", "4 lines". */
export const plural = (count: number, one: string, many = `${one}s`): string => `${count.toLocaleString('en-GB')} ${count === 1 ? one : many}`

export const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1)
