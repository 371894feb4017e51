import { keepCar } from '@/lib/contracts/my-garage'
import { keepMyCar } from '@/lib/entrants/commands/keep-garage'
import { handle } from '@/lib/http/server'

export const PUT = handle(keepCar, keepMyCar)
