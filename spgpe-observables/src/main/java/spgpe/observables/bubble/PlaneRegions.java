package spgpe.observables.bubble;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;

/**
 * Connected components of a periodic plane, four neighbours to a point, by union-find.
 *
 * <p>Each point knows its displacement from the root of its tree on the unrolled plane. Where two
 * points of one tree meet with displacements that differ by whole periods, the component closes on
 * itself around the axis: a disc across a seam does not, a band does. One frame at a time.
 */
final class PlaneRegions {
  private static final int NONE = -1;

  private final int pointsX;
  private final int pointsY;

  /** Parent in the tree, NONE for points below the level. */
  private final int[] parent;

  private final int[] displacementX;
  private final int[] displacementY;
  private final boolean[] wrapsX;
  private final boolean[] wrapsY;
  private final int[] count;

  PlaneRegions(int pointsX, int pointsY) {
    int points = pointsX * pointsY;
    this.pointsX = pointsX;
    this.pointsY = pointsY;
    this.parent = new int[points];
    this.displacementX = new int[points];
    this.displacementY = new int[points];
    this.wrapsX = new boolean[points];
    this.wrapsY = new boolean[points];
    this.count = new int[points];
  }

  /** All components above a level in the order of their first points. */
  List<Region> above(double[] frame, double level) {
    Arrays.fill(wrapsX, false);
    Arrays.fill(wrapsY, false);
    Arrays.fill(count, 0);
    for (int p = 0; p < parent.length; p++) {
      parent[p] = frame[p] > level ? p : NONE;
      displacementX[p] = 0;
      displacementY[p] = 0;
    }
    for (int y = 0, p = 0; y < pointsY; y++) {
      for (int x = 0; x < pointsX; x++, p++) {
        if (parent[p] != NONE) {
          join(p, x + 1 < pointsX ? p + 1 : p + 1 - pointsX, 1, 0);
          join(p, y + 1 < pointsY ? p + pointsX : x, 0, 1);
        }
      }
    }
    return collect();
  }

  private void join(int a, int b, int stepX, int stepY) {
    if (parent[b] == NONE) {
      return;
    }
    int rootA = root(a);
    int rootB = root(b);
    int betweenX = displacementX[a] + stepX - displacementX[b];
    int betweenY = displacementY[a] + stepY - displacementY[b];
    if (rootA == rootB) {
      wrapsX[rootA] |= betweenX != 0;
      wrapsY[rootA] |= betweenY != 0;
      return;
    }
    // the root is the first point of a component
    int above = Math.min(rootA, rootB);
    int below = Math.max(rootA, rootB);
    int sign = below == rootB ? 1 : -1;
    parent[below] = above;
    displacementX[below] = sign * betweenX;
    displacementY[below] = sign * betweenY;
    wrapsX[above] |= wrapsX[below];
    wrapsY[above] |= wrapsY[below];
  }

  /** Root of a point, which becomes its parent. */
  private int root(int point) {
    int root = point;
    int x = 0;
    int y = 0;
    while (parent[root] != root) {
      x += displacementX[root];
      y += displacementY[root];
      root = parent[root];
    }
    int p = point;
    while (parent[p] != root && p != root) {
      int next = parent[p];
      int nextX = x - displacementX[p];
      int nextY = y - displacementY[p];
      parent[p] = root;
      displacementX[p] = x;
      displacementY[p] = y;
      x = nextX;
      y = nextY;
      p = next;
    }
    return root;
  }

  private List<Region> collect() {
    List<Integer> roots = new ArrayList<>();
    for (int p = 0; p < parent.length; p++) {
      if (parent[p] != NONE) {
        int root = root(p);
        if (count[root]++ == 0) {
          roots.add(root);
        }
      }
    }
    int[][] points = new int[roots.size()][];
    for (int r = 0; r < points.length; r++) {
      points[r] = new int[count[roots.get(r)]];
      count[roots.get(r)] = r;
    }
    int[] filled = new int[points.length];
    for (int p = 0; p < parent.length; p++) {
      if (parent[p] != NONE) {
        int r = count[parent[p]];
        points[r][filled[r]++] = p;
      }
    }
    List<Region> regions = new ArrayList<>();
    for (int r = 0; r < points.length; r++) {
      regions.add(new Region(points[r], wrapsX[roots.get(r)], wrapsY[roots.get(r)]));
    }
    return regions;
  }
}
