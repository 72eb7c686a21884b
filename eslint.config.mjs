// Node 20 lacks Object.groupBy, which the shared configuration calls.
Object.groupBy ??= (items, key) => {
  const groups = Object.create(null)
  let index = 0
  for (const item of items) (groups[key(item, index++)] ??= []).push(item)
  return groups
}
const { default: withNuxt } = await import('./.nuxt/eslint.config.mjs')

export default withNuxt(
  { ignores: ['.data/**', '.data-test/**', 'drizzle/**', 'shared/line-lists/**/*.json'] },
  { rules: { '@typescript-eslint/no-explicit-any': 'error', 'vue/multi-word-component-names': 'off', 'vue/require-default-prop': 'off' } },
  // Published constants are written with all their digits.
  { files: ['shared/engine/**', 'tests/**'], rules: { 'no-loss-of-precision': 'off' } },
)
