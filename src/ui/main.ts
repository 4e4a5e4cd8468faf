/** Where the window starts: its host, its worker, its workspace, its view. */
import './theme.css'
import { mount } from 'svelte'
import { startWorker } from '#worker/start.ts'
import App from './App.svelte'
import { connectToHost } from './state/transport.ts'
import { Workspace } from './state/workspace.svelte.ts'
import StartFailure from './views/frame/StartFailure.svelte'

async function start(target: HTMLElement): Promise<void> {
  try {
    const workspace = await Workspace.start(connectToHost(), startWorker)
    mount(App, { target, props: { workspace } })
  } catch (error) {
    // Without a host there is no job to show; the sentence says what to do.
    const sentence = error instanceof Error ? error.message : String(error)
    mount(StartFailure, { target, props: { sentence } })
  }
}

const target = document.querySelector<HTMLElement>('#window')
if (target) start(target).catch(() => {})
