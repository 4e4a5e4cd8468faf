/** What a canvas has to ask for, since no style sheet reaches it: the colours of the theme, and whether to keep still. */
import { createSubscriber } from 'svelte/reactivity'

/** Whoever reads the theme inside an effect is run again when the system's or the window's own setting changes. */
const onThemeChange = createSubscriber((changed) => {
  const queries = [
    '(prefers-color-scheme: dark)',
    '(forced-colors: active)',
    '(prefers-reduced-motion: reduce)',
  ].map((query) => matchMedia(query))
  const observer = new MutationObserver(changed)
  observer.observe(document.documentElement, { attributeFilter: ['data-theme'] })
  for (const query of queries) query.addEventListener('change', changed)
  return () => {
    observer.disconnect()
    for (const query of queries) query.removeEventListener('change', changed)
  }
})

/** A colour token of theme.css as `rgb(…)`. The element's own text colour does the resolving: a canvas shows none. */
export function themeColour(canvas: HTMLCanvasElement, token: `--${string}`): string {
  onThemeChange()
  canvas.style.color = `var(${token})`
  return getComputedStyle(canvas).color
}

export function prefersStillness(): boolean {
  onThemeChange()
  return matchMedia('(prefers-reduced-motion: reduce)').matches
}
