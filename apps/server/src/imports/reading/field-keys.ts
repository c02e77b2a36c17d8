/** The things that a column can say, by the names that a mapping uses. */
export type FieldKey =
  | 'tag'
  | 'description'
  | 'function'
  | 'location'
  | 'product'
  | 'machine'
  | 'boreMm'
  | 'outsideMm'
  | 'widthMm'
  | 'speedRpm'
  | 'hoursPerDay'
  | 'daysPerWeek'
  | 'demandCm3Per100h'
  | 'demandCm3Per1000h'
  | 'grease'
  | 'dispenserType'
  | 'cartridgeCm3'
  | 'doseCm3'
  | 'wiring'
  | 'controller'
  | 'outputModule'
  | 'outputChannel'
  | 'outputAddress'
  | 'statusModule'
  | 'statusChannel'
  | 'statusAddress'
  | SignalKey
  | 'junctionBox'
  | 'cableTag'
  | 'cableLengthM'
  | 'crossSectionMm2'
  | 'circuit'
  | 'remarks';

/** What a row says of the one signal that it stands for, in a list with a row a signal. */
export type SignalKey = 'signalType' | 'module' | 'channel' | 'address';
