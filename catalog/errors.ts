export type CatalogErrorCode =
  | "unusable_folder"
  | "foreign_data"
  | "damaged_data"
  | "newer_data"
  | "unknown_catalog"
  | "refused_import";

/**
 * What is wrong with the data on disk or with what was asked of it, in one line for whoever runs the service. It is
 * not for faults in a request: those are `InputError`.
 */
export class CatalogError extends Error {
  override readonly name = "CatalogError";
  readonly code: CatalogErrorCode;

  constructor(code: CatalogErrorCode, message: string, cause?: unknown) {
    super(message, { cause });
    this.code = code;
  }
}
