interface PreventableEvent {
  defaultPrevented: boolean
  preventDefault(): void
}

export function preventableEvent(): PreventableEvent {
  const event = {
    defaultPrevented: false,
    preventDefault: () => {
      event.defaultPrevented = true
    },
  }
  return event
}
