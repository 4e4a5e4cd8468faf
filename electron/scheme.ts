/** The page's own address, app://lagwright, served from the built files with the host's security headers. */
import { protocol } from 'electron'
import { readPageFile } from '#backend/page/files.ts'
import { securityHeaders } from '#backend/page/headers.ts'

const scheme = 'app'
const host = 'lagwright'
export const pageOrigin = `${scheme}://${host}`
export const pageUrl = `${pageOrigin}/index.html`

/** Must run before the app is ready. */
export function declareScheme(): void {
  const privileges = { standard: true, secure: true, supportFetchAPI: true }
  protocol.registerSchemesAsPrivileged([{ scheme, privileges }])
}

export function servePage(folder: string): void {
  protocol.handle(scheme, async (request) => {
    const url = new URL(request.url)
    const file = url.host === host ? await readPageFile(folder, url.pathname) : null
    if (!file) return new Response('Not found.', { status: 404, headers: securityHeaders })
    return new Response(file.body, { headers: file.headers })
  })
}
