import { spawn } from 'node:child_process'

export function hasDisplay() {
  if (process.platform !== 'linux') return true
  return Boolean(process.env.DISPLAY || process.env.WAYLAND_DISPLAY)
}

/**
 * Opens the user's own browser. The address is printed as well, so a machine without one loses nothing.
 * @param {string} url
 */
export function openInBrowser(url) {
  const [command, ...args] = opener(url)
  spawn(command, args, { stdio: 'ignore', detached: true })
    .on('error', () => {})
    .unref()
}

/**
 * @param {string} url
 * @returns {[string, ...string[]]}
 */
function opener(url) {
  // `start` takes its first quoted word for a window title, hence the empty one.
  if (process.platform === 'win32') return ['cmd', '/c', 'start', '', url]
  return [process.platform === 'darwin' ? 'open' : 'xdg-open', url]
}
