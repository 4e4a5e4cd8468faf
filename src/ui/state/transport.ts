/** How the window reaches its host: through Electron's preload where there is one, else by HTTP. */
import type { Failure } from '#contract/failures.ts'
import type { Host } from '#contract/host.ts'
import {
  connect,
  decode,
  encode,
  maxCallBytes,
  type Reply,
  type Transport,
} from '#contract/wire.ts'

declare global {
  interface Window {
    /** Put there by electron/preload.ts. */
    readonly shell?: { readonly call: Transport }
  }
}

/** The typed host of this window. Made once, where the window starts. */
export function connectToHost(): Host {
  return connect(window.shell?.call ?? overHttp(takeToken()))
}

/**
 * The loopback host puts its token in the fragment of the address it opens. It moves to the session storage of
 * this tab, so that reloading works, and out of the address bar, so that it is not copied along.
 */
function takeToken(): string {
  const given = new URLSearchParams(location.hash.slice(1)).get('token')
  if (given) {
    sessionStorage.setItem('token', given)
    history.replaceState(null, '', location.pathname)
  }
  return sessionStorage.getItem('token') ?? ''
}

const failed = (failure: Failure): Reply => ({ ok: false, failure })

function overHttp(token: string): Transport {
  const headers = { authorization: `Bearer ${token}`, 'content-type': 'application/json' }
  return async (name, input) => {
    try {
      const body = encode([name, input])
      const response = await fetch('/call', { method: 'POST', headers, body })
      if (response.status === 403) return failed({ code: 'host/no-key' })
      if (response.status === 413)
        return failed({ code: 'request/too-large', maxBytes: maxCallBytes })
      // `serve` made this text on the other side; a page cannot check more than its shape here.
      return response.ok ? (decode(await response.text()) as Reply) : failed({ code: 'host/gone' })
    } catch {
      return failed({ code: 'host/gone' })
    }
  }
}
