let made = 0

export interface ReaderElement {
  readonly id: string
  readonly element: HTMLElement
  /** Makes it as wide as the camera's picture, in CSS pixels, and draws it scaled into the host. */
  readonly setWidth: (px: number) => void
  readonly remove: () => void
}

/**
 * The element html5-qrcode draws into. It scans CSS pixels: in an element narrower than the camera's picture the picture is shrunk first, and
 * small codes are never read. So it is as wide as the camera and only looks smaller.
 */
export function readerElement(host: HTMLElement): ReaderElement {
  const element = document.createElement('div')
  element.id = `reader-${++made}`
  element.style.transformOrigin = '0 0'
  host.style.overflow = 'hidden'
  host.append(element)
  const fit = () => {
    const scale = host.clientWidth / Math.max(1, element.offsetWidth)
    element.style.transform = `scale(${scale})`
    if (element.offsetHeight > 0) host.style.height = `${Math.round(element.offsetHeight * scale)}px`
  }
  const observer = new ResizeObserver(fit)
  observer.observe(host)
  observer.observe(element)
  return {
    id: element.id,
    element,
    setWidth: (px) => {
      element.style.width = `${px}px`
      fit()
    },
    remove: () => {
      observer.disconnect()
      element.remove()
      host.style.height = ''
    },
  }
}
