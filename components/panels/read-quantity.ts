import type { QuantityReading } from '@/components/ui/quantity-field';

/** An entry that must lie within bounds, with the sentence that says so. */
export function within(
  reading: QuantityReading,
  least: number,
  most: number,
  message: string,
): QuantityReading {
  if (!reading.ok) return reading;
  return reading.value < least || reading.value > most ? { ok: false, message } : reading;
}
