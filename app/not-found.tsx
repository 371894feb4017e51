import Link from 'next/link'
import { Brand } from './_ui/brand'
import { buttonClass } from './_ui/button'
import { PageFrame } from './_ui/page-frame'

export default function NotFound() {
  return (
    <PageFrame title="There is nothing at this address" width="text" navigation={<Brand />}>
      <p className="max-w-prose">The link may be old or cut short, or what it names is not open to you. Nothing was changed.</p>
      <p className="mt-6">
        <Link className={buttonClass('primary')} href="/">
          Go to the start
        </Link>
      </p>
    </PageFrame>
  )
}
