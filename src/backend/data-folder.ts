/** Where the program keeps what is the user's own: settings and jobs that have no name yet. */
import { homedir } from 'node:os'
import { join, resolve } from 'node:path'

type Environment = Readonly<Record<string, string | undefined>>

/** LAGWRIGHT_DATA where it is set, else the usual per-user place of the system. */
export function dataFolder(
  env: Environment = process.env,
  platform: NodeJS.Platform = process.platform,
): string {
  if (env.LAGWRIGHT_DATA) return resolve(env.LAGWRIGHT_DATA)
  const home = homedir()
  if (platform === 'win32')
    return join(env.LOCALAPPDATA || join(home, 'AppData', 'Local'), 'Lagwright')
  if (platform === 'darwin') return join(home, 'Library', 'Application Support', 'Lagwright')
  return join(env.XDG_DATA_HOME || join(home, '.local', 'share'), 'lagwright')
}
