export { type Fault, InputError } from "./input-error.ts";
