package spgpe.observables.bubble;

import java.util.ArrayList;
import java.util.List;

/** A bubble while it is followed. */
final class OpenBubble {
  final int index;
  private final BubbleEvent.Kind origin;
  private final double birthTime;
  private final Site birthSite;
  private final double length;
  private final List<double[]> walls = new ArrayList<>();
  private final List<Extent> extents = new ArrayList<>();
  private final List<Double> extentTimes = new ArrayList<>();
  private double largestWidth;
  private boolean filled;
  private double endTime;
  private BubbleEvent.Kind fate;
  private int mergedInto = -1;

  OpenBubble(
      int index, BubbleEvent.Kind origin, double birthTime, Site birthSite, double length) {
    this.index = index;
    this.origin = origin;
    this.fate = origin;
    this.birthTime = birthTime;
    this.endTime = birthTime;
    this.birthSite = birthSite;
    this.length = length;
  }

  Site birthSite() {
    return birthSite;
  }

  /** Sees the bubble in a frame; true if it fills everything for the first time. */
  boolean see(double time, double width, boolean fillsAll) {
    endTime = time;
    largestWidth = Math.max(largestWidth, width);
    boolean first = fillsAll && !filled;
    filled |= fillsAll;
    if (first) {
      fate = BubbleEvent.Kind.FILLED;
    }
    return first;
  }

  /** Adds wall positions, moved by whole turns next to the last ones. */
  void addWalls(double time, double left, double right) {
    double turns = 0;
    if (!walls.isEmpty()) {
      double[] last = walls.get(walls.size() - 1);
      turns = length * Math.rint(((last[1] + last[2]) - (left + right)) / 2 / length);
    }
    walls.add(new double[] {time, left + turns, right + turns});
  }

  void addExtent(double time, Extent extent) {
    extentTimes.add(time);
    extents.add(extent);
  }

  void end(double time, BubbleEvent.Kind how, int into) {
    endTime = time;
    fate = how;
    mergedInto = into;
  }

  Bubble close(long trajectory, BubbleSettings settings) {
    int n = walls.size();
    double[] times = new double[n];
    double[] left = new double[n];
    double[] right = new double[n];
    for (int i = 0; i < n; i++) {
      times[i] = walls.get(i)[0];
      left[i] = walls.get(i)[1];
      right[i] = walls.get(i)[2];
    }
    boolean accepted =
        largestWidth >= settings.minimumWidth()
            && endTime - birthTime >= settings.minimumDuration();
    return new Bubble(
        trajectory, index, origin, birthTime, birthSite, endTime, fate, mergedInto, largestWidth,
        accepted, WallTrack.of(times, left, right),
        RadiusTrack.of(
            extentTimes.stream().mapToDouble(Double::doubleValue).toArray(), extents));
  }
}
