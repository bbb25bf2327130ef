package spgpe.observables.bubble;

import java.util.ArrayList;
import java.util.List;

/** A run of neighbouring points of a ring: start, start+1, ..., start+length-1 modulo N. */
record Region(int start, int length) {
  /** All maximal runs above a level, in the order of their first points; the seam is no border. */
  static List<Region> above(double[] profile, double level) {
    int n = profile.length;
    List<Region> regions = new ArrayList<>();
    int gap = 0;
    while (gap < n && profile[gap] > level) {
      gap++;
    }
    if (gap == n) {
      regions.add(new Region(0, n));
      return regions;
    }
    int i = gap + 1;
    while (i < gap + n) {
      if (!(profile[i % n] > level)) {
        i++;
        continue;
      }
      int start = i;
      while (i < gap + n && profile[i % n] > level) {
        i++;
      }
      regions.add(new Region(start % n, i - start));
    }
    return regions;
  }

  int point(int i, int n) {
    return (start + i) % n;
  }
}
