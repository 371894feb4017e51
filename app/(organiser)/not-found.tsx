import Link from 'next/link'
import { Brand } from '@/app/_ui/brand'
import { buttonClass } from '@/app/_ui/button'
import { PageFrame } from '@/app/_ui/page-frame'

export default function NotFoundPage() {
  return (
    <PageFrame title="There is nothing of this address for you" width="text" navigation={<Brand />}>
      <p>Either it never was, or it belongs to an event or a role that is not yours. Nothing was changed.</p>
      <p className="mt-6">
        <Link className={buttonClass('primary')} href="/events">
          Your events
        </Link>
      </p>
    </PageFrame>
  )
}
