export { default } from '@/app/(public)/p/[token]/not-found'
