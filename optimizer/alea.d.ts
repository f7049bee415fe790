/** Types of the one generator of seedrandom that the search uses, imported alone to keep the others out of bundles. */
declare module 'seedrandom/lib/alea.js' {
  export interface AleaState {
    readonly c: number;
    readonly s0: number;
    readonly s1: number;
    readonly s2: number;
  }
  export interface Alea {
    (): number;
    state(): AleaState;
  }
  export default function alea(seed: string, options: { state: true | AleaState }): Alea;
}
