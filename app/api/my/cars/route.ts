import { addCar } from '@/lib/contracts/my-garage'
import { addMyCar } from '@/lib/entrants/commands/keep-garage'
import { handle } from '@/lib/http/server'

export const POST = handle(addCar, addMyCar)
