/**
 * Ambient range of the automotive qualification grades 0..3, °C.
 * Source: AEC-Q100 Rev-H (2014), table 1. Grade 4 existed only up to Rev-G.
 */
export const AEC_Q100_AMBIENT = [
  { grade: 0, min: -40, max: 150 },
  { grade: 1, min: -40, max: 125 },
  { grade: 2, min: -40, max: 105 },
  { grade: 3, min: -40, max: 85 },
] as const;

/**
 * Supplies met in practice, V.
 * Source: USB 2.0 specification (2000), sec. 7.2.2 (a later change raised the maximum to 5.5 V: from memory); single lithium-ion cell
 * of cobalt-oxide chemistry: common practice.
 */
export const COMMON_SUPPLIES = {
  usbHighPowerPort: { min: 4.75, max: 5.25 },
  usbLowPowerPort: { min: 4.4, max: 5.25 },
  lithiumCell: { min: 3, max: 4.2 },
} as const;
