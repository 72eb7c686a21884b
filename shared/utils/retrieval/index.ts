export { prepareFromTable } from './from-table'
export { prepareFromSpectrum } from './from-spectrum'
export type { InputProblem, Prepared } from './problem'
