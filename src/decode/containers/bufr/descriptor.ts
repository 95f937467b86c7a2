/** What the first digit of a descriptor says: WMO-No. 306, FM 94 regulation 94.5. */
export const ELEMENT = 0;
export const REPLICATION = 1;
export const OPERATOR = 2;

/** A descriptor taken apart: 1 04 002 is F 1, X 4, Y 2. */
export interface DescriptorParts {
  f: number;
  x: number;
  y: number;
}

/** Takes a descriptor, F X Y written as one number, apart. */
export function splitDescriptor(descriptor: number): DescriptorParts {
  return { f: Math.floor(descriptor / 100_000), x: Math.floor(descriptor / 1000) % 100, y: descriptor % 1000 };
}

/** A descriptor from its two octets: 2 bits F, 6 bits X, 8 bits Y (FM 94 section 3). */
export function descriptorFromOctets(first: number, second: number): number {
  return (first >> 6) * 100_000 + (first & 63) * 1000 + second;
}

/** A descriptor as the manual writes it: '3 12 061'. */
export function formatDescriptor(descriptor: number): string {
  const digits = String(descriptor).padStart(6, '0');
  return `${digits.slice(0, 1)} ${digits.slice(1, 3)} ${digits.slice(3)}`;
}
