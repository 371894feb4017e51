/** The package ships declarations that its `exports` map hides. */
declare module 'weeknumber' {
  export function weekNumber(date: Date): number
  export function weekNumberSun(date: Date): number
}
