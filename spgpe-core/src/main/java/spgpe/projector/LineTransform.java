package spgpe.projector;

import spgpe.fourier.FourierProvider;
import spgpe.fourier.FourierTransform;

/** Transform of a one-dimensional region. */
final class LineTransform extends LaneTransform {
  private final FourierTransform fourier;
  private final int[] places;
  private final double[] buffer;

  LineTransform(CoherentRegion region, int components, int lanes, FourierProvider provider) {
    super(region, components, lanes);
    int points = region.grid().points();
    this.fourier = plan(provider, points);
    this.places = new int[region.modes()];
    for (int m = 0; m < places.length; m++) {
      places[m] = 2 * region.gridIndex(m);
    }
    this.buffer = new double[2 * points];
  }

  @Override
  void inverse(
      double[] modesRe, double[] modesIm, double[] pointsRe, double[] pointsIm, int lane) {
    scatter(modesRe, modesIm, lane, places, buffer);
    fourier.inverse(buffer, 0);
    unpack(buffer, pointsRe, pointsIm, lane);
  }

  @Override
  void forward(
      double[] pointsRe, double[] pointsIm, double[] modesRe, double[] modesIm, int lane) {
    pack(pointsRe, pointsIm, lane, buffer);
    fourier.forward(buffer, 0);
    gather(buffer, places, modesRe, modesIm, lane);
  }
}
