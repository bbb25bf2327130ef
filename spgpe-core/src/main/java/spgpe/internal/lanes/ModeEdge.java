package spgpe.internal.lanes;

/**
 * What the passes at the side of the modes need: for each row the place of its mode and the factor
 * it is multiplied by. Rows without a mode have place 0, factor 0. Immutable.
 */
final class ModeEdge {
  final LaneLayout layout;
  final Twiddles twiddles;

  /** Begin of the mode in the arrays of modes. */
  final int[] places;

  /** Whether the row has a mode. */
  final boolean[] kept;

  final double[] factorRe;
  final double[] factorIm;

  ModeEdge(
      LaneLayout layout, Twiddles twiddles, int[] modes, double[] factorRe, double[] factorIm) {
    this.layout = layout;
    this.twiddles = twiddles;
    this.places = new int[modes.length];
    this.kept = new boolean[modes.length];
    for (int row = 0; row < modes.length; row++) {
      kept[row] = modes[row] >= 0;
      places[row] = kept[row] ? modes[row] * layout.lanes() : 0;
    }
    this.factorRe = factorRe;
    this.factorIm = factorIm;
  }
}
