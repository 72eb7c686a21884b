import { defineConfig } from 'drizzle-kit'

export default defineConfig({
  dialect: 'mysql',
  casing: 'snake_case',
  schema: './server/database/schema.ts',
  out: './drizzle',
})
