/**
 * Being asked to stop: the first SIGINT, SIGTERM or SIGHUP asks the sweep to save and end; a second SIGINT leaves at once
 * (files are replaced in one step, so nothing is damaged).
 */
import { STATUS } from '../errors.ts';

/** Signals that ask for an orderly end, with the exit status of each. */
export const SIGNALS = { SIGHUP: STATUS.hangUp, SIGINT: STATUS.interrupt, SIGTERM: STATUS.terminate } as const;
export type StopSignal = keyof typeof SIGNALS;

/** A request to stop that may come at any time. */
export interface StopRequest {
  /** The signal that came first; undefined while none has. */
  readonly signal: StopSignal | undefined;
  /** Resolves when the first signal comes. */
  readonly asked: Promise<void>;
  /** Stops listening. */
  dispose(): void;
}

/** Starts listening for signals to this process; `onAsk` is told of the first. */
export function listenForStop(onAsk: (signal: StopSignal) => void): StopRequest {
  let first: StopSignal | undefined;
  let resolve = (): void => {};
  const asked = new Promise<void>((done) => {
    resolve = done;
  });
  const handlers = (Object.keys(SIGNALS) as StopSignal[]).map((signal) => {
    const handler = (): void => {
      if (first !== undefined) {
        if (signal === 'SIGINT') process.exit(STATUS.interrupt);
        return;
      }
      first = signal;
      onAsk(signal);
      resolve();
    };
    process.on(signal, handler);
    return { signal, handler };
  });
  const dispose = (): void => {
    for (const { signal, handler } of handlers) process.off(signal, handler);
  };
  return {
    get signal() {
      return first;
    },
    asked,
    dispose,
  };
}
