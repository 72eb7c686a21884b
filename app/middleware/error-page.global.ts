/** While an error is being shown nobody's session is asked for, so the page guard must not send to sign-in instead. */
export default defineNuxtRouteMiddleware((to) => {
  if (useNuxtApp().ssrContext?.error || useError().value) to.meta.auth = false
})
