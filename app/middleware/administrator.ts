/** Pages for administrators of the service; the routes behind them refuse everybody else by themselves. */
export default defineNuxtRouteMiddleware(() => {
  const user = useSessionUser()
  if (user.value && !user.value.isAdministrator) return abortNavigation(createError({ statusCode: 403, message: 'This page is for administrators of the service.', fatal: true }))
})
