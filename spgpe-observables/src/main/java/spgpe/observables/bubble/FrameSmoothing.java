package spgpe.observables.bubble;

import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;

/** Smoothing of a frame with a Gaussian, axis by axis. Owns scratch memory: one thread. */
final class FrameSmoothing {
  private final PeriodicSmoothing[] axes;
  private final int pointsX;
  private final double[] line;
  private final double[] smoothLine;
  private final boolean nothing;

  FrameSmoothing(PeriodicGrid grid, double smoothing) {
    this.axes = new PeriodicSmoothing[grid.dimension()];
    int longest = 0;
    for (int a = 0; a < axes.length; a++) {
      Axis axis = grid.axis(a);
      axes[a] = new PeriodicSmoothing(axis.points(), axis.spacing(), smoothing);
      longest = Math.max(longest, axis.points());
    }
    this.pointsX = grid.axis(0).points();
    this.line = new double[longest];
    this.smoothLine = new double[longest];
    this.nothing = smoothing == 0;
  }

  void apply(double[] frame, double[] result) {
    if (axes.length == 1) {
      axes[0].apply(frame, result);
      return;
    }
    System.arraycopy(frame, 0, result, 0, frame.length);
    if (nothing) {
      return;
    }
    int pointsY = frame.length / pointsX;
    for (int y = 0; y < pointsY; y++) {
      along(axes[0], result, y * pointsX, 1, pointsX);
    }
    for (int x = 0; x < pointsX; x++) {
      along(axes[1], result, x, pointsX, pointsY);
    }
  }

  private void along(
      PeriodicSmoothing smoothing, double[] frame, int start, int step, int points) {
    for (int i = 0; i < points; i++) {
      line[i] = frame[start + i * step];
    }
    smoothing.apply(line, smoothLine);
    for (int i = 0; i < points; i++) {
      frame[start + i * step] = smoothLine[i];
    }
  }
}
