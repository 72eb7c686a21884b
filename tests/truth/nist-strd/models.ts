/** A model of the nonlinear collection (`nonlinear/Models.txt`): value and derivatives by parameters at predictors x. */
export interface NistModel {
  value: (b: Float64Array, x: readonly number[]) => number
  gradient: (b: Float64Array, x: readonly number[]) => number[]
  /** What is compared with the model; the response itself unless said otherwise. */
  response?: (y: number) => number
}

const { exp, log } = Math

/** b1 (1 - exp(-b2 x)) */
const rise: NistModel = {
  value: ([b1, b2], [x]) => b1 * (1 - exp(-b2 * x)),
  gradient: ([b1, b2], [x]) => [1 - exp(-b2 * x), b1 * x * exp(-b2 * x)],
}

/** exp(-b1 x) / (b2 + b3 x) */
const chwirut: NistModel = {
  value: ([b1, b2, b3], [x]) => exp(-b1 * x) / (b2 + b3 * x),
  gradient: ([b1, b2, b3], [x]) => {
    const f = exp(-b1 * x) / (b2 + b3 * x)
    return [-x * f, -f / (b2 + b3 * x), -x * f / (b2 + b3 * x)]
  },
}

/** Two Gaussians on a decaying background. */
const gauss: NistModel = {
  value: (b, [x]) => b[0] * exp(-b[1] * x) + b[2] * exp(-((x - b[3]) ** 2) / b[4] ** 2) + b[5] * exp(-((x - b[6]) ** 2) / b[7] ** 2),
  gradient: (b, [x]) => {
    const peak = (height: number, centre: number, width: number) => {
      const e = exp(-((x - centre) ** 2) / width ** 2)
      return [e, height * e * 2 * (x - centre) / width ** 2, height * e * 2 * (x - centre) ** 2 / width ** 3]
    }
    const e = exp(-b[1] * x)
    return [e, -b[0] * x * e, ...peak(b[2], b[3], b[4]), ...peak(b[5], b[6], b[7])]
  },
}

/** Sum of three exponentials. */
const lanczos: NistModel = {
  value: (b, [x]) => b[0] * exp(-b[1] * x) + b[2] * exp(-b[3] * x) + b[4] * exp(-b[5] * x),
  gradient: (b, [x]) => [0, 2, 4].flatMap(j => [exp(-b[j + 1] * x), -x * b[j] * exp(-b[j + 1] * x)]),
}

export const nistModels: Record<string, NistModel> = {
  Bennett5: {
    value: ([b1, b2, b3], [x]) => b1 * (b2 + x) ** (-1 / b3),
    gradient: ([b1, b2, b3], [x]) => {
      const p = (b2 + x) ** (-1 / b3)
      return [p, -b1 / b3 * p / (b2 + x), b1 * p * log(b2 + x) / b3 ** 2]
    },
  },
  BoxBOD: rise,
  Chwirut1: chwirut,
  Chwirut2: chwirut,
  DanWood: {
    value: ([b1, b2], [x]) => b1 * x ** b2,
    gradient: ([b1, b2], [x]) => [x ** b2, b1 * x ** b2 * log(x)],
  },
  Eckerle4: {
    value: ([b1, b2, b3], [x]) => b1 / b2 * exp(-0.5 * ((x - b3) / b2) ** 2),
    gradient: ([b1, b2, b3], [x]) => {
      const z = (x - b3) / b2
      const e = exp(-0.5 * z * z) / b2
      return [e, b1 * e / b2 * (z * z - 1), b1 * e * z / b2]
    },
  },
  Gauss1: gauss,
  Gauss2: gauss,
  Lanczos2: lanczos,
  Lanczos3: lanczos,
  MGH09: {
    value: ([b1, b2, b3, b4], [x]) => b1 * (x * x + x * b2) / (x * x + x * b3 + b4),
    gradient: ([b1, b2, b3, b4], [x]) => {
      const above = x * x + x * b2
      const below = x * x + x * b3 + b4
      return [above / below, b1 * x / below, -b1 * above * x / below ** 2, -b1 * above / below ** 2]
    },
  },
  MGH10: {
    value: ([b1, b2, b3], [x]) => b1 * exp(b2 / (x + b3)),
    gradient: ([b1, b2, b3], [x]) => {
      const e = exp(b2 / (x + b3))
      return [e, b1 * e / (x + b3), -b1 * e * b2 / (x + b3) ** 2]
    },
  },
  MGH17: {
    value: ([b1, b2, b3, b4, b5], [x]) => b1 + b2 * exp(-x * b4) + b3 * exp(-x * b5),
    gradient: ([, b2, b3, b4, b5], [x]) => [1, exp(-x * b4), exp(-x * b5), -x * b2 * exp(-x * b4), -x * b3 * exp(-x * b5)],
  },
  Misra1a: rise,
  Misra1b: {
    value: ([b1, b2], [x]) => b1 * (1 - (1 + b2 * x / 2) ** -2),
    gradient: ([b1, b2], [x]) => [1 - (1 + b2 * x / 2) ** -2, b1 * x * (1 + b2 * x / 2) ** -3],
  },
  Misra1c: {
    value: ([b1, b2], [x]) => b1 * (1 - (1 + 2 * b2 * x) ** -0.5),
    gradient: ([b1, b2], [x]) => [1 - (1 + 2 * b2 * x) ** -0.5, b1 * x * (1 + 2 * b2 * x) ** -1.5],
  },
  Misra1d: {
    value: ([b1, b2], [x]) => b1 * b2 * x / (1 + b2 * x),
    gradient: ([b1, b2], [x]) => [b2 * x / (1 + b2 * x), b1 * x / (1 + b2 * x) ** 2],
  },
  Nelson: {
    value: ([b1, b2, b3], [x1, x2]) => b1 - b2 * x1 * exp(-b3 * x2),
    gradient: ([, b2, b3], [x1, x2]) => [1, -x1 * exp(-b3 * x2), b2 * x1 * x2 * exp(-b3 * x2)],
    response: log,
  },
  Rat42: {
    value: ([b1, b2, b3], [x]) => b1 / (1 + exp(b2 - b3 * x)),
    gradient: ([b1, b2, b3], [x]) => {
      const e = exp(b2 - b3 * x)
      return [1 / (1 + e), -b1 * e / (1 + e) ** 2, b1 * x * e / (1 + e) ** 2]
    },
  },
  Thurber: {
    value: (b, [x]) => (b[0] + x * (b[1] + x * (b[2] + x * b[3]))) / (1 + x * (b[4] + x * (b[5] + x * b[6]))),
    gradient: (b, [x]) => {
      const below = 1 + x * (b[4] + x * (b[5] + x * b[6]))
      const f = (b[0] + x * (b[1] + x * (b[2] + x * b[3]))) / below
      return [1, x, x * x, x ** 3, -x * f, -x * x * f, -(x ** 3) * f].map(part => part / below)
    },
  },
}
