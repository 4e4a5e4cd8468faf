/** Own schemes: app://host/path is opened as http://host.app.localhost/path and answered by its handler. */
import type { Page } from 'playwright-core'

type Handler = (request: Request) => Response | Promise<Response>
const handlers = new Map<string, Handler>()
let isReady = false

export const protocol = {
  registerSchemesAsPrivileged(_schemes: unknown): void {
    if (isReady)
      throw new Error('protocol.registerSchemesAsPrivileged should be called before app is ready')
  },
  handle: (scheme: string, handler: Handler): void => void handlers.set(scheme, handler),
}

export function closeRegistration(): void {
  isReady = true
}

export const toBrowserUrl = (url: string): string =>
  url.replace(/^([a-z]+):\/\/([\w-]+)/, 'http://$2.$1.localhost')

export const toAppUrl = (url: string): string =>
  url.replace(/^http:\/\/([\w-]+)\.([a-z]+)\.localhost/, '$2://$1')

/** Lets handlers answer whatever the page asks for; no page of the program reaches the network. */
export async function answerRequests(page: Page): Promise<void> {
  await page.route('**/*', async (route) => {
    const request = route.request()
    const url = toAppUrl(request.url())
    const handler = handlers.get(new URL(url).protocol.slice(0, -1))
    if (!handler) return route.abort()
    const response = await handler(new Request(url, { method: request.method() }))
    return route.fulfill({
      status: response.status,
      headers: Object.fromEntries(response.headers),
      body: Buffer.from(await response.arrayBuffer()),
    })
  })
}
