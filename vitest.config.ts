import { fileURLToPath } from 'node:url'
import { defineVitestProject } from '@nuxt/test-utils/config'
import { defineConfig } from 'vitest/config'

const alias = { '#shared': fileURLToPath(new URL('./shared', import.meta.url)), '~~': fileURLToPath(new URL('.', import.meta.url)), '~': fileURLToPath(new URL('./app', import.meta.url)) }

export default defineConfig({
  test: {
    projects: [
      { resolve: { alias }, test: { name: 'unit', environment: 'node', include: ['tests/unit/**/*.test.ts'], testTimeout: 30_000 } },
      { resolve: { alias }, test: { name: 'truth', environment: 'node', include: ['tests/truth/**/*.test.ts'], testTimeout: 120_000 } },
      { resolve: { alias }, test: { name: 'integration', environment: 'node', include: ['tests/integration/**/*.test.ts'], testTimeout: 300_000, hookTimeout: 300_000, fileParallelism: false, globalSetup: ['tests/helpers/integration-setup.ts'] } },
      await defineVitestProject({ test: { name: 'nuxt', environment: 'nuxt', include: ['tests/nuxt/**/*.test.ts'], environmentOptions: { nuxt: { domEnvironment: 'happy-dom' } } } }),
    ],
  },
})
