/**
 * A clamp over some or all strings at one fret.
 * `strings` are string numbers as players count: 1 is the highest-sounding side.
 * A capo that covers fewer than all strings is a partial capo.
 */
export type Capo = { fret: number; strings: number[] };

/**
 * How one instrument must be for one song. `open` holds MIDI note numbers (A4 = 69) of the strings with
 * nothing clamped, low side first, as players write a tuning; its last entry is string 1.
 */
export type Neck = { open: number[]; capos: Capo[] };
