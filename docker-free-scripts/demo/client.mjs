/** The service's own API with a bearer token; an answer that is not 2xx is an error with the service's words. */
export function createClient(origin, token) {
  async function call(method, path, { json, form, headers = {}, allow = [] } = {}) {
    const response = await fetch(`${origin}${path}`, {
      method,
      headers: { authorization: `Bearer ${token}`, ...(json ? { 'content-type': 'application/json' } : {}), ...headers },
      body: json ? JSON.stringify(json) : form,
    })
    const answer = await response.json()
    if (response.ok || allow.includes(response.status)) return answer
    throw new Error(`${method} ${path} answered ${response.status}: ${answer.error?.message ?? 'no reason'} ${JSON.stringify(answer.error?.fields ?? '')}`)
  }
  return {
    get: path => call('GET', path),
    /** 409: it is there already. */
    create: (path, json) => call('POST', path, { json, allow: [409] }),
    async upload(slug, { name, text, about }) {
      const form = new FormData()
      form.append('about', JSON.stringify(about))
      form.append('files', new Blob([text]), name)
      const { items: [item] } = await call('POST', `/api/campaigns/${slug}/spectra`, { form })
      if (!item.ok) throw new Error(`${name} was refused: ${item.error.message}`)
      return item.id
    },
    submit: (slug, key, json) => call('POST', `/api/campaigns/${slug}/retrievals`, { json, headers: { 'idempotency-key': key } }),
  }
}
