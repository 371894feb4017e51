import { OutcomeShape } from '@/app/_ui/outcome-shape'
import { PageFrame } from '@/app/_ui/page-frame'
import { PlainBar } from '../../_frame/plain-bar'

/** A code that none of our devices signed, or that is damaged. */
export default function NotOursPage() {
  return (
    <PageFrame title="Not one of ours" width="text" navigation={<PlainBar />}>
      <p className="flex items-center gap-4">
        <OutcomeShape state="ask" className="size-16" />
        <span className="heading text-2xl">No pass of this club has this code</span>
      </p>
      <p className="mt-6 max-w-prose">
        The address may be cut or mistyped: scan the sticker again, or the second one on the other side of the screen. If it stays so, it is
        no pass of this club; show it to the crew.
      </p>
    </PageFrame>
  )
}
