declare module "js-quantities" {
  /** The part that tests use: a quantity read from text, in SI base units. */
  export default function Qty(text: string): { toBase(): { readonly scalar: number } };
}
