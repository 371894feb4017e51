import { seeBoard } from '@/lib/board/queries/see-board'
import { board } from '@/lib/contracts/board'
import { handle } from '@/lib/http/server'
import { dayReading } from '@/lib/sync/server/day-reading'

export const GET = handle(board, seeBoard(dayReading))
