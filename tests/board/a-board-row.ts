import type { BoardRow } from '@/lib/contracts/board'

/** A row of the board; a test states only what matters to it. */
export function aRow(number: string, given: Partial<BoardRow> = {}): BoardRow {
  return {
    id: `entry ${number}`,
    number,
    plate: 'GF90 VGN',
    model: 'Halden 1.6 hatch',
    colour: 'turquoise',
    group: 'novice',
    drivers: ['Lena Penhale'],
    verdict: 'not presented',
    wire: [],
    sentence: '',
    open: null,
    needs: [],
    ...given,
  }
}
