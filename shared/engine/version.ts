/** Stored with every result; raised whenever a number could change. */
export const engineVersion = '0.1.0'
