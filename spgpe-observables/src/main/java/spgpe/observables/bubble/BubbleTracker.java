package spgpe.observables.bubble;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.SortedSet;
import java.util.TreeSet;
import org.jspecify.annotations.Nullable;
import spgpe.grid.PeriodicGrid;

/**
 * Follows bubbles from frame to frame. A region above the grow level belongs to the bubbles with
 * which it shares a point in the frame before; without such a bubble it is a new one if it exceeds
 * the seed level. Frames come in the order of time.
 */
final class BubbleTracker {
  private static final int NOT_THERE = -2;
  private static final int GONE = -1;

  private final BubbleSettings settings;
  private final FrameGeometry geometry;
  private final double[] smooth;
  private final List<OpenBubble> bubbles = new ArrayList<>();
  private final List<BubbleEvent> events = new ArrayList<>();
  /** Index of the bubble at each point, -1 for none. */
  private int[] owner;

  private int[] nextOwner;
  private int frames;

  BubbleTracker(BubbleSettings settings, PeriodicGrid grid) {
    int points = grid.points();
    this.settings = settings;
    this.geometry = FrameGeometry.of(grid, settings.smoothing());
    this.smooth = new double[points];
    this.owner = new int[points];
    this.nextOwner = new int[points];
    Arrays.fill(owner, -1);
  }

  void add(double time, double[] profile) {
    geometry.smooth(profile, smooth);
    List<Region> regions = geometry.regionsAbove(smooth, settings.growLevel());
    List<SortedSet<Integer>> parents = new ArrayList<>();
    for (Region region : regions) {
      parents.add(ownersIn(region));
    }
    int[] heir = heirs(regions);
    Arrays.fill(nextOwner, -1);
    for (int r = 0; r < regions.size(); r++) {
      OpenBubble bubble = identify(time, r, regions.get(r), parents.get(r), heir);
      if (bubble != null) {
        follow(bubble, time, regions.get(r));
      }
    }
    for (int b = 0; b < heir.length; b++) {
      if (heir[b] == GONE) {
        bubbles.get(b).end(time, BubbleEvent.Kind.COLLAPSED, -1);
        report(time, BubbleEvent.Kind.COLLAPSED, b, -1, bubbles.get(b).birthSite());
      }
    }
    int[] swap = owner;
    owner = nextOwner;
    nextOwner = swap;
    frames++;
  }

  private SortedSet<Integer> ownersIn(Region region) {
    SortedSet<Integer> found = new TreeSet<>();
    for (int p : region.points) {
      int b = owner[p];
      if (b >= 0) {
        found.add(b);
      }
    }
    return found;
  }

  /**
   * For each bubble the region that shares most points with it (of equals that with the higher
   * peak, a rule that does not depend on where the frame is cut), GONE if none does, NOT_THERE if
   * it was not in the frame before.
   */
  private int[] heirs(List<Region> regions) {
    int[] heir = new int[bubbles.size()];
    int[] most = new int[bubbles.size()];
    double[] highest = new double[bubbles.size()];
    Arrays.fill(heir, NOT_THERE);
    for (int b : owner) {
      if (b >= 0) {
        heir[b] = GONE;
      }
    }
    int[] shared = new int[bubbles.size()];
    for (int r = 0; r < regions.size(); r++) {
      Arrays.fill(shared, 0);
      double peak = Double.NEGATIVE_INFINITY;
      for (int p : regions.get(r).points) {
        peak = Math.max(peak, smooth[p]);
        if (owner[p] >= 0) {
          shared[owner[p]]++;
        }
      }
      for (int b = 0; b < shared.length; b++) {
        if (shared[b] > 0
            && (shared[b] > most[b] || (shared[b] == most[b] && peak > highest[b]))) {
          most[b] = shared[b];
          highest[b] = peak;
          heir[b] = r;
        }
      }
    }
    return heir;
  }

  /** The bubble that a region is, with the mergers and splits this means; null for none. */
  private @Nullable OpenBubble identify(
      double time, int index, Region region, SortedSet<Integer> parents, int[] heir) {
    if (parents.isEmpty()) {
      if (!isSeeded(region)) {
        return null;
      }
      BubbleEvent.Kind kind =
          frames == 0 ? BubbleEvent.Kind.PRESENT_AT_START : BubbleEvent.Kind.NUCLEATED;
      return open(time, kind, -1, region);
    }
    int identity = -1;
    for (int parent : parents) {
      if (heir[parent] != index) {
        continue;
      }
      if (identity < 0) {
        identity = parent; // the oldest goes on
      } else {
        bubbles.get(parent).end(time, BubbleEvent.Kind.MERGED, identity);
        report(time, BubbleEvent.Kind.MERGED, parent, identity, meetingPoint(region));
      }
    }
    return identity >= 0
        ? bubbles.get(identity)
        : open(time, BubbleEvent.Kind.SPLIT, parents.first(), region);
  }

  private boolean isSeeded(Region region) {
    for (int p : region.points) {
      if (smooth[p] > settings.seedLevel()) {
        return true;
      }
    }
    return false;
  }

  private OpenBubble open(double time, BubbleEvent.Kind kind, int other, Region region) {
    Site site = geometry.mean(region, smooth, settings.seedLevel());
    OpenBubble bubble =
        new OpenBubble(bubbles.size(), kind, time, site, geometry.grid.axis(0).length());
    bubbles.add(bubble);
    report(time, kind, bubble.index, other, bubble.birthSite());
    return bubble;
  }

  private void follow(OpenBubble bubble, double time, Region region) {
    for (int p : region.points) {
      nextOwner[p] = bubble.index;
    }
    boolean fills = region.size() == smooth.length;
    if (bubble.see(time, 2 * geometry.radius(region.size()), fills)) {
      report(time, BubbleEvent.Kind.FILLED, bubble.index, -1, bubble.birthSite());
    }
    geometry.read(bubble, time, region, smooth, settings.wallLevel());
  }

  private Site meetingPoint(Region region) {
    return geometry.grid.dimension() == 1
        ? new Site(geometry.substitute(0, region, smooth), 0)
        : geometry.mean(region, smooth, Double.NEGATIVE_INFINITY);
  }

  private void report(double time, BubbleEvent.Kind kind, int bubble, int other, Site site) {
    events.add(new BubbleEvent(0, time, kind, bubble, other, site));
  }

  /** The history; only now the index of the trajectory is known. */
  BubbleHistory finish(long trajectory, double endTime) {
    List<BubbleEvent> named = new ArrayList<>();
    for (BubbleEvent e : events) {
      named.add(
          new BubbleEvent(trajectory, e.time(), e.kind(), e.bubble(), e.other(), e.site()));
    }
    List<Bubble> closed = new ArrayList<>();
    for (OpenBubble bubble : bubbles) {
      closed.add(bubble.close(trajectory, settings));
    }
    return new BubbleHistory(trajectory, endTime, settings, frames, closed, named);
  }
}
