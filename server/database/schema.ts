/** All tables, for the client and for migrations. */
export * from './accounts/schema'
export * from './campaigns/schema'
export * from './spectra/schema'
export * from './batches/schema'
export * from './retrievals/schema'
export * from './outbox/schema'
export * from './logbook/schema'
export * from './idempotency/schema'
