/** Something in a submission that keeps it from being computed: where (a dotted path) and what, with how to mend it. */
export interface InputProblem { path: string, message: string }

export type Prepared<Input> = { input: Input } | { problem: InputProblem[] }
