export type { Archive, KeptAnswer } from "./archive.ts";
export { checkRecord } from "./check-record.ts";
export { CatalogError, type CatalogErrorCode } from "./errors.ts";
export type { Imported, ImportOptions, Snapshot } from "./revisions.ts";
export { DEFAULT_CATALOG, openStore, type Store, type StoreOptions } from "./store.ts";
