/** Starts the worker. Kept apart from its client, which is tested with workers of its own. */
import workerUrl from './solve.worker.ts?worker&url'

interface Policy {
  createScriptURL(url: string): string
}
interface TrustedTypes {
  createPolicy(name: string, rules: Policy): Policy
}

// The content security policy lets a worker start only at an address that a named policy has made.
const asIs: Policy = { createScriptURL: (url) => url }
const trustedTypes = (globalThis as { trustedTypes?: TrustedTypes }).trustedTypes
const policy = trustedTypes?.createPolicy('app-worker', asIs) ?? asIs

export function startWorker(): Worker {
  return new Worker(policy.createScriptURL(workerUrl), { type: 'module', name: 'sizing' })
}
