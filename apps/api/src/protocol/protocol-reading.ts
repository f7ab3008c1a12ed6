/** Reads a protocol that somebody sent: size first, then shape and meaning. */
import { readProtocol } from '@weftway/pathway/protocol-faults';
import type { ProtocolReading } from '@weftway/pathway/protocol-faults';
import { firstFaults, sizeFaults } from './protocol-limits.ts';

/** Bytes of a protocol document; about fifteen times the one that we ship. */
export const protocolBytes = 2 * 1024 * 1024;

export const readSentProtocol = (document: unknown): ProtocolReading => {
  const tooLarge = sizeFaults(document);
  if (tooLarge.length > 0) return { ok: false, faults: firstFaults(tooLarge) };
  const reading = readProtocol(document);
  return reading.ok ? reading : { ok: false, faults: firstFaults(reading.faults) };
};
