/** A band of frequencies, Hz, `from` < `to`. */
export type RadioBand = { readonly from: number; readonly to: number };

/** What one radio does to another, as far as the budget reads it from a datasheet. */
export type RadioFigures = {
  readonly receiveOnly: boolean;
  readonly transmitBands: readonly RadioBand[];
  readonly receiveBands: readonly RadioBand[];
  /** Carrier power at the connector, W. */
  readonly power: number;
  /** Broadband transmitter noise, dBc/Hz. */
  readonly noiseDbcPerHz: number;
  readonly noiseFigureDb: number;
  /** Receiver bandwidth, Hz. */
  readonly bandwidth: number;
  /** Strongest off-channel carrier at the connector that the receiver bears, dBm. */
  readonly overloadDbm: number;
  /** Rejection of the filter in the radio's line, by band. */
  readonly rejections: readonly (RadioBand & { readonly rejectionDb: number })[];
};
