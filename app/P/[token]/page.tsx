// A sticker's code is all upper case, so that it stays small; addresses are not the same in both cases.
export { default, metadata } from '@/app/(public)/p/[token]/page'

export const dynamic = 'force-dynamic'
