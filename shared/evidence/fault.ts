import type { Fault, FaultCode } from './findings.ts';

/** A fault at the row that must be mended. */
export function fault(code: FaultCode, sentence: string, at: string, span?: Fault['span']): Fault {
  return { shape: 'fault', code, sentence, at, ...(span === undefined ? {} : { span }) };
}

/** Whether something is a fault in place of a value. */
export function isFault(value: object): value is Fault {
  return 'shape' in value && value.shape === 'fault';
}

/**
 * The fault of a value that needs another, faulty one: it points at the row to mend, and is passed on unchanged
 * from there.
 *
 * @param symbol - shown symbol of the quantity that has the fault itself
 */
export function passedOn(cause: Fault, symbol: string): Fault {
  if (cause.via !== undefined) return cause;
  return {
    ...fault('missing input', `${symbol} has to be mended first. ${cause.sentence}`, cause.at),
    via: symbol,
  };
}
