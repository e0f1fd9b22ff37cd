/** What is used of cephes; its own types are not found by the module resolution of this project. */
declare module 'cephes' {
  export function j1(x: number): number;
  /** Bessel function of order v. */
  export function jv(v: number, x: number): number;
}
