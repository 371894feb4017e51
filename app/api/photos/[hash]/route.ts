import { getPhoto, putPhoto } from '@/lib/contracts/photos'
import { handleDownload } from '@/lib/http/download'
import { handleUpload } from '@/lib/http/upload'
import { keepSentPhoto } from '@/lib/photos/commands/keep-sent-photo'
import { showPhoto } from '@/lib/photos/queries/show-photo'

export const PUT = handleUpload(putPhoto, keepSentPhoto)
export const GET = handleDownload(getPhoto, showPhoto)
