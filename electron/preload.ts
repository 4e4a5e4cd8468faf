import { contextBridge, ipcRenderer } from 'electron'
import type { Transport } from '#contract/wire.ts'

const call: Transport = (name, input) => ipcRenderer.invoke('call', name, input)
contextBridge.exposeInMainWorld('shell', { call })
