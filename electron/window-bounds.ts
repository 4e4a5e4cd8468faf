/** Where the window stood when it was last closed. Losing this file loses nothing else. */
import { readFileSync, writeFileSync } from 'node:fs'
import { type BrowserWindow, type Rectangle, screen } from 'electron'
import { z } from 'zod'

const boundsSchema = z.object({ x: z.int(), y: z.int(), width: z.int(), height: z.int() })
const first = { width: 1280, height: 840 }

export function savedBounds(file: string): Partial<Rectangle> {
  const saved = read(file)
  return saved && isOnScreen(saved) ? saved : first
}

export function keepBounds(window: BrowserWindow, file: string): void {
  window.on('close', () => {
    try {
      writeFileSync(file, JSON.stringify(window.getNormalBounds()))
    } catch (error) {
      console.error('The place of the window could not be kept:', error)
    }
  })
}

function read(file: string): Rectangle | null {
  try {
    return boundsSchema.parse(JSON.parse(readFileSync(file, 'utf8')))
  } catch {
    return null
  }
}

/** A window on a screen that is no longer plugged in could not be reached. */
function isOnScreen({ x, y, width, height }: Rectangle): boolean {
  return screen.getAllDisplays().some(({ workArea }) => {
    const overlapX = Math.min(x + width, workArea.x + workArea.width) - Math.max(x, workArea.x)
    const overlapY = Math.min(y + height, workArea.y + workArea.height) - Math.max(y, workArea.y)
    return overlapX >= 200 && overlapY >= 100
  })
}
