'use client'

import { Dialog, type DialogProps } from './dialog'

/** A dialog that rises from the lower edge; a press beside it closes it. */
export function Sheet(props: Omit<DialogProps, 'from' | 'closesOutside'>) {
  return <Dialog {...props} from="below" closesOutside />
}
