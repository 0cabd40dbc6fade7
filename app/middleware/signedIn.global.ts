/** Sends visitors to the sign-in page, as a courtesy; each route checks for itself. */
export default defineNuxtRouteMiddleware(async (to) => {
  if (to.meta.public) return
  const { me } = await useMe()
  if (!me.value) return navigateTo({ path: '/sign-in', query: to.fullPath === '/' ? {} : { then: to.fullPath } })
})
