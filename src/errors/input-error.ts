/** One thing wrong with what was given: where (a JSON Pointer into the request) and why, in a sentence. */
export interface Fault {
  readonly pointer: string;
  readonly detail: string;
}

/**
 * Input that is well formed but breaks a rule of the model: a mass of nothing, feet on one line, a target
 * that cannot be judged. It carries every fault found, never only the first. It is not for programming
 * mistakes (those stay plain errors and show nothing to the caller).
 */
export class InputError extends Error {
  override readonly name = "InputError";
  readonly faults: readonly Fault[];

  constructor(faults: readonly Fault[]) {
    super(faults.map((fault) => `${fault.pointer}: ${fault.detail}`).join("; "));
    this.faults = faults;
  }

  static at(pointer: string, detail: string): InputError {
    return new InputError([{ pointer, detail }]);
  }
}
