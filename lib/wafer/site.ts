/**
 * One place on a wafer where a probe reads, in millimetres from the wafer centre:
 * +y points away from the notch or flat, +x to the right when the notch is at the bottom.
 */
export interface Site {
  xMm: number;
  yMm: number;
}
