// The one barrel of the project: drizzle wants every table in one object.
export * from './account'
export * from './club'
export * from './crew'
export * from './entry'
export * from './event'
export * from './log'
export * from './mail'
export * from './photo'
