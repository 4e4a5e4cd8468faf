/** The files of the built window, for the loopback host and for Electron's app:// alike. */
import { readFile } from 'node:fs/promises'
import { extname, resolve, sep } from 'node:path'
import { securityHeaders } from './headers.ts'

/** Nothing else is ever served, so no source map, database or dot file can slip out. */
const typeOf = new Map([
  ['.html', 'text/html; charset=utf-8'],
  ['.js', 'text/javascript; charset=utf-8'],
  ['.css', 'text/css; charset=utf-8'],
  ['.svg', 'image/svg+xml'],
  ['.png', 'image/png'],
  ['.woff2', 'font/woff2'],
])

interface PageFile {
  readonly body: Buffer<ArrayBuffer>
  readonly headers: Readonly<Record<string, string>>
}

/** A file of the window by the path of its URL, or null where there is none. */
export async function readPageFile(folder: string, urlPath: string): Promise<PageFile | null> {
  const path = decoded(urlPath === '/' ? '/index.html' : urlPath)
  // `resolve` would take a slash at the end away, and serve a file as if it were a folder.
  if (path === null || path.includes('\0') || path.endsWith('/')) return null
  const root = resolve(folder)
  const file = resolve(root, `.${path}`)
  const type = typeOf.get(extname(file))
  if (!file.startsWith(root + sep) || !type) return null
  try {
    return { body: await readFile(file), headers: { ...securityHeaders, 'content-type': type } }
  } catch {
    return null
  }
}

function decoded(urlPath: string): string | null {
  try {
    return decodeURIComponent(urlPath)
  } catch {
    return null
  }
}
