declare module '#nitro-internal-virtual/server-handlers' {
  export const handlers: { route?: string, method?: string }[]
}
