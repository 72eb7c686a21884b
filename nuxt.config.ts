import { fileURLToPath } from 'node:url'
import { bundleThread } from './server/threads/bundle.mjs'

const indexing = { compilerOptions: { noUncheckedIndexedAccess: false } }

export default defineNuxtConfig({
  modules: ['@nuxt/eslint', '@pinia/nuxt', '@nuxtjs/tailwindcss', '@nuxtjs/color-mode', '@vueuse/nuxt', '@nuxt/icon', '@sidebase/nuxt-auth'],
  compatibilityDate: '2026-01-01',
  devtools: { enabled: false },
  telemetry: false,
  css: ['~/assets/css/main.css'],
  app: {
    head: {
      htmlAttrs: { lang: 'en' },
      titleTemplate: '%s · Trotline',
      meta: [{ name: 'viewport', content: 'width=device-width, initial-scale=1' }],
    },
  },
  colorMode: { preference: 'day', fallback: 'day', dataValue: 'theme', classSuffix: '', storage: 'cookie', storageKey: 'trotline-theme' },
  icon: { serverBundle: 'local', clientBundle: { scan: true }, provider: 'server', fallbackToApi: false },
  auth: {
    isEnabled: true,
    disableServerSideAuth: false,
    baseURL: '/api/auth',
    provider: { type: 'authjs', trustHost: true, addDefaultCallbackUrl: false },
    globalAppMiddleware: true,
    sessionRefresh: { enablePeriodically: false, enableOnWindowFocus: true },
  },
  tailwindcss: { viewer: false, cssPath: false },
  imports: { autoImport: true },
  nitro: {
    preset: 'node-server',
    experimental: { tasks: true },
    scheduledTasks: { '* * * * *': ['reconcile', 'deliver-mail', 'digests'], '17 * * * *': ['sweep'] },
    errorHandler: '~~/server/utils/error-handler.ts',
    // Before the sign-in module's own plugin.
    plugins: [fileURLToPath(new URL('./server/start/auth-origin.ts', import.meta.url))],
    serverAssets: [{ baseName: 'migrations', dir: fileURLToPath(new URL('./drizzle', import.meta.url)), pattern: '*.sql' }],
    virtual: { '#compute-thread': async () => `export default ${JSON.stringify(await bundleThread())}` },
    esbuild: { options: { target: 'node20' } },
    typescript: { tsConfig: indexing },
  },
  typescript: {
    strict: true,
    typeCheck: false,
    // The engine indexes typed arrays in its loops; its own tsconfig says the same.
    tsConfig: indexing,
    sharedTsConfig: indexing,
    nodeTsConfig: indexing,
  },
  eslint: { config: { stylistic: false } },
  vite: { worker: { format: 'es' } },
})
