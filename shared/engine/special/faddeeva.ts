/** Step of the rules: sqrt(pi / (N + 1)) for N = 11 (Al Azah & Chandler-Wilde 2021, 1.11). */
const h = Math.sqrt(Math.PI / 12)
/** t_k = k h and (k + 1/2) h, k = 0 .. 11. */
const trapezium = nodes(0)
const midpoint = nodes(0.5)
/** pi / h: from here up the rule needs no correction for the pole at z. */
const yFree = Math.PI / h
/** Beyond it the squares of the sums overflow; w = i / (sqrt(pi) z) is exact to rounding there. */
const far = 1e75
/** e^-745 is the smallest double. */
const underflow = -745.2

/** Squares of the nodes and their weights (2 h / pi) e^{-t^2}, halved for t = 0. */
function nodes(offset: number): { t: Float64Array, weight: Float64Array } {
  const t = Float64Array.from({ length: 12 }, (_, k) => (k + offset) * h)
  return { t, weight: t.map(tk => (tk === 0 ? 1 : 2) * h / Math.PI * Math.exp(-tk * tk)) }
}

/**
 * The Faddeeva function w(z) = e^{-z^2} erfc(-i z) (DLMF 7.2.3) and its derivative at z = x + i y.
 * Re w(x + i y) with y > 0 is the Voigt function H(a = y, u = x).
 *
 * Method: the trapezium or the midpoint rule with 12 pairs of nodes for w = (i/pi) integral of e^{-t^2} / (z - t), corrected
 * for the pole at t = z (Matta & Reichel 1971; rule and choice of nodes of Al Azah & Chandler-Wilde 2021, SIAM J. Numer. Anal. 59, 2346).
 * The derivative w' = -2 z w + 2 i / sqrt(pi) (DLMF 7.10.2) is summed from the same nodes without its cancellation at large |z|.
 *
 * Valid for every finite z. Relative error below 1e-13 in Re w, Im w for y >= 0 (tests/truth: against scipy and 60-digit series),
 * and in |w'|. For y < 0 by w(z) = 2 e^{-z^2} - w(-z) (DLMF 7.4.3), which overflows to infinity where y^2 - x^2 > 709.
 *
 * @param x real part of z, dimensionless
 * @param y imaginary part of z, dimensionless
 * @param out receives Re w, Im w, Re w', Im w'; with K = Re w these are K, L, dK/dx, -dK/dy
 * @returns `out`
 * @example
 * faddeeva(0, 0)[0] // => 1
 * faddeeva(1, 0)[0] // => 0.36787944117144233
 * faddeeva(0, 1)[0] // => 0.427583576155807
 * faddeeva(2, 1)[2] // => -0.11653144510531344
 */
export function faddeeva(x: number, y: number, out: Float64Array = new Float64Array(4)): Float64Array {
  if (y < 0) return lowerHalf(x, y, out)
  const u = Math.abs(x)
  if (u > far || y > far) leading(u, y, out)
  else upperQuadrant(u, y, out)
  // w(-conj z) = conj w(z) (DLMF 7.4.4)
  if (x < 0) {
    out[1] = -out[1]
    out[2] = -out[2]
  }
  return out
}

/** x, y >= 0. */
function upperQuadrant(x: number, y: number, out: Float64Array): void {
  const part = x / h - Math.floor(x / h)
  // Al Azah & Chandler-Wilde 2021, 1.13: stay a quarter of a step away from every node.
  const useTrapezium = y < Math.max(x, yFree) && part >= 0.25 && part <= 0.75
  sumNodes(useTrapezium ? trapezium : midpoint, x, y, out)
  if (y < Math.max(x, yFree)) addPole(x, y, useTrapezium ? -1 : 1, out)
}

/** Pairs +-t of the rule: (i/pi) h sum of e^{-t^2} 2 z / (z^2 - t^2), and the same for w' with -2 t^2 in place of z. */
function sumNodes({ t, weight }: { t: Float64Array, weight: Float64Array }, x: number, y: number, out: Float64Array): void {
  const yy = y * y
  const rr = x * x + yy
  let k = 0, l = 0, even = 0, odd = 0
  for (let i = 0; i < t.length; i++) {
    const tt = t[i] * t[i]
    const below = x - t[i]
    const above = x + t[i]
    // |z^2 - t^2|^2
    const share = weight[i] / ((below * below + yy) * (above * above + yy))
    k += share * (rr + tt)
    l += share * (rr - tt)
    even += share * tt
    odd += share * tt * (below * above - yy)
  }
  out[0] = y * k
  out[1] = x * l
  out[2] = -4 * x * y * even
  out[3] = -2 * odd
}

/**
 * Adds 2 e^{-z^2} q / (q + sign), q = e^{2 pi i z / h} (1.9, 1.10 of the paper, multiplied through by q so that nothing overflows),
 * and its share -2 z (...) of the derivative.
 */
function addPole(x: number, y: number, sign: number, out: Float64Array): void {
  const size = y * y - x * x - 2 * Math.PI / h * y
  if (size < underflow) return
  const qSize = Math.exp(-2 * Math.PI / h * y)
  const angle = 2 * Math.PI / h * x
  const qRe = qSize * Math.cos(angle) + sign
  const qIm = qSize * Math.sin(angle)
  const p = 2 * Math.exp(size) / (qRe * qRe + qIm * qIm)
  const turn = angle - 2 * x * y
  const c = Math.cos(turn)
  const s = Math.sin(turn)
  const re = p * (c * qRe + s * qIm)
  const im = p * (s * qRe - c * qIm)
  out[0] += re
  out[1] += im
  out[2] -= 2 * (x * re - y * im)
  out[3] -= 2 * (x * im + y * re)
}

/** i / (sqrt(pi) z) and -i / (sqrt(pi) z^2). */
function leading(x: number, y: number, out: Float64Array): void {
  const r = Math.hypot(x, y)
  const c = x / r
  const s = y / r
  const size = 1 / (Math.sqrt(Math.PI) * r)
  out[0] = s * size
  out[1] = c * size
  out[2] = -2 * c * s * size / r
  out[3] = -(c - s) * (c + s) * size / r
}

function lowerHalf(x: number, y: number, out: Float64Array): Float64Array {
  faddeeva(-x, -y, out)
  const e = 2 * Math.exp((y - x) * (y + x))
  const re = e * Math.cos(2 * x * y)
  const im = -e * Math.sin(2 * x * y)
  out[0] = re - out[0]
  out[1] = im - out[1]
  // d/dz of 2 e^{-z^2} - w(-z) is -4 z e^{-z^2} + w'(-z).
  out[2] += -2 * (x * re - y * im)
  out[3] += -2 * (x * im + y * re)
  return out
}
