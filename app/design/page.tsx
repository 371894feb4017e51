import type { Metadata } from 'next'
import { Brand } from '@/app/_ui/brand'
import { PageFrame } from '@/app/_ui/page-frame'
import { GloveSwitch } from '@/app/_ui/glove-switch'
import { ThemeSwitch } from '@/app/_ui/theme-switch'
import { ButtonsSample } from './buttons-sample'
import { EntrySample } from './entry-sample'
import { OutcomesSample } from './outcomes-sample'
import { ScreensSample } from './screens-sample'
import { TalkSample } from './talk-sample'
import { WireSample } from './wire-sample'

export const metadata: Metadata = { title: 'Design', robots: { index: false } }

/** Every primitive in every state, to look at and to measure. In no menu. */
export default function DesignPage() {
  return (
    <PageFrame
      title="Design"
      subtitle="Every primitive in every state. What you see here is invented."
      actions={
        <>
          <GloveSwitch />
          <ThemeSwitch />
        </>
      }
      navigation={<Brand />}
    >
      <div className="grid gap-12">
        <WireSample />
        <OutcomesSample />
        <ScreensSample />
        <ButtonsSample />
        <EntrySample />
        <TalkSample />
      </div>
    </PageFrame>
  )
}
