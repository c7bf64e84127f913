/**
 * Ship transmit frequencies of the maritime VHF band, ITU Radio Regulations, Appendix 18:
 * channels 1 to 28 fifty kilocycles apart, 60 to 88 half way between them.
 * Counted in kilocycles so that no fraction is lost.
 */
export function shipFrequencyKc(channel: number): number {
  if (Number.isInteger(channel) && channel >= 1 && channel <= 28) return 156_000 + 50 * channel;
  if (Number.isInteger(channel) && channel >= 60 && channel <= 88) return 156_025 + 50 * (channel - 60);
  throw new RangeError(`Channel ${channel} is not in the maritime VHF plan`);
}
