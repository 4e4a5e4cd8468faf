import type { Handlers } from '#contract/host.ts'

/** Handlers of which a test replaces those it asks for; any other is a mistake of the test. */
export function handlersWith(own: Partial<Handlers>): Handlers {
  const others = new Proxy(own, {
    get: (target, name) =>
      Reflect.get(target, name) ??
      (() => {
        throw new Error(`The test has no handler ${String(name)}.`)
      }),
  })
  return others as Handlers
}
