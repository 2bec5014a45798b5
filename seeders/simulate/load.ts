/** A simulated device: its power at each whole second from the start. */
export interface Load {
  /** W, one value a second. */
  watts: Float64Array;
}
