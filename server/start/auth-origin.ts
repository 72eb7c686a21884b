import { defineNitroPlugin } from 'nitropack/runtime'

/** The sign-in module reads its address from its own variable; ours is the one that operators set. Runs before the module's check. */
export default defineNitroPlugin(() => {
  process.env.AUTH_ORIGIN ??= `${process.env.TROTLINE_ORIGIN ?? 'http://127.0.0.1:4310'}/api/auth`
})
