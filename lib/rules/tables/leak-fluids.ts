/** Fluids that share a row of limits. */
export const FLUID_GROUPS = ['fuel', 'hydraulic', 'oil', 'coolant', 'damperOil', 'electrolyte', 'water'] as const
export type FluidGroup = (typeof FLUID_GROUPS)[number]

export const FLUID_IDS = [
  'fuel',
  'brake-fluid',
  'clutch-fluid',
  'engine-oil',
  'gearbox-oil',
  'axle-oil',
  'steering-oil',
  'coolant',
  'damper-oil',
  'battery-electrolyte',
  'high-voltage-coolant',
  'washer-water',
  'air-con-water',
  'not-known',
] as const
export type FluidId = (typeof FLUID_IDS)[number]

/** What may be found wet, as the walk lists it; the group is null where nobody could say what it is. */
export const FLUIDS: Readonly<Record<FluidId, { readonly label: string; readonly group: FluidGroup | null }>> = {
  fuel: { label: 'Fuel', group: 'fuel' },
  'brake-fluid': { label: 'Brake fluid', group: 'hydraulic' },
  'clutch-fluid': { label: 'Clutch fluid', group: 'hydraulic' },
  'engine-oil': { label: 'Engine oil', group: 'oil' },
  'gearbox-oil': { label: 'Gearbox oil', group: 'oil' },
  'axle-oil': { label: 'Axle oil', group: 'oil' },
  'steering-oil': { label: 'Power steering oil', group: 'oil' },
  coolant: { label: 'Coolant', group: 'coolant' },
  'damper-oil': { label: 'Damper oil', group: 'damperOil' },
  'battery-electrolyte': { label: 'Battery acid or electrolyte', group: 'electrolyte' },
  'high-voltage-coolant': { label: 'Coolant of a high-voltage battery', group: 'electrolyte' },
  'washer-water': { label: 'Washer water', group: 'water' },
  'air-con-water': { label: 'Water from the air conditioning', group: 'water' },
  'not-known': { label: 'Not known what it is', group: null },
}

export const LEAK_CLASS_IDS = ['dry', 'wet', 'drops-form', 'drops-fall'] as const
export type LeakClassId = (typeof LEAK_CLASS_IDS)[number]

/** How far a leak has gone, as the walk lists it. */
export const LEAK_CLASSES: Readonly<Record<LeakClassId, { readonly label: string }>> = {
  dry: { label: 'Dry' },
  wet: { label: 'Wet or stained, no drops' },
  'drops-form': { label: 'Drops form and stay' },
  'drops-fall': { label: 'Drops fall' },
}

export const LEAK_REACHES_IDS = ['nothing', 'exhaust', 'tyre-or-brake'] as const
export type LeakReachesId = (typeof LEAK_REACHES_IDS)[number]

/** What the leak gets onto, as the walk lists it. */
export const LEAK_REACHES: Readonly<Record<LeakReachesId, { readonly label: string }>> = {
  nothing: { label: 'Nothing that matters' },
  exhaust: { label: 'The exhaust' },
  'tyre-or-brake': { label: 'A tyre or a brake' },
}
