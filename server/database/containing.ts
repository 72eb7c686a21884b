/** A LIKE pattern; % and _ in a search are letters like any other. */
export const containing = (text: string) => `%${text.replace(/[\\%_]/g, '\\$&')}%`
