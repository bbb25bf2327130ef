package spgpe.observables.bubble;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;

/**
 * A plain and slow bubble detector written from the definitions: sets of points, flood fill, full
 * sums. Gives the events as text.
 */
final class ReferenceTracker {
  private ReferenceTracker() {}

  /** Time and site of a birth out of the metastable state. */
  record Birth(double time, double site) {}

  static List<String> events(
      double[] times, double[][] frames, double length, BubbleSettings settings) {
    return events(times, frames, length, settings, new ArrayList<>());
  }

  static List<String> events(
      double[] times, double[][] frames, double length, BubbleSettings settings,
      List<Birth> births) {
    List<String> events = new ArrayList<>();
    Map<Integer, Set<Integer>> before = new HashMap<>();
    Set<Integer> filled = new HashSet<>();
    int next = 0;
    for (int s = 0; s < times.length; s++) {
      double[] smooth = smooth(frames[s], length, settings.smoothing());
      List<Set<Integer>> regions = regions(smooth, settings.growLevel());
      Map<Integer, Integer> heir = new HashMap<>();
      for (Map.Entry<Integer, Set<Integer>> old : before.entrySet()) {
        double best = 0;
        for (int r = 0; r < regions.size(); r++) {
          Set<Integer> common = new HashSet<>(regions.get(r));
          common.retainAll(old.getValue());
          double peak = regions.get(r).stream().mapToDouble(p -> smooth[p]).max().orElseThrow();
          double score = common.size() + peak * 1e-6; // most points, then the higher peak
          if (!common.isEmpty() && score > best) {
            best = score;
            heir.put(old.getKey(), r);
          }
        }
      }
      Map<Integer, Set<Integer>> now = new HashMap<>();
      for (int r = 0; r < regions.size(); r++) {
        int index = r;
        List<Integer> inherited =
            before.keySet().stream()
                .filter(b -> heir.containsKey(b) && heir.get(b) == index).sorted().toList();
        List<Integer> touched =
            before.entrySet().stream()
                .filter(e -> e.getValue().stream().anyMatch(regions.get(index)::contains))
                .map(Map.Entry::getKey).sorted().toList();
        int id;
        if (!inherited.isEmpty()) {
          id = inherited.get(0);
          for (int b : inherited.subList(1, inherited.size())) {
            events.add(times[s] + " MERGED " + b + " " + id);
          }
        } else if (!touched.isEmpty()) {
          id = next++;
          events.add(times[s] + " SPLIT " + id + " " + touched.get(0));
        } else if (regions.get(r).stream().anyMatch(p -> smooth[p] > settings.seedLevel())) {
          id = next++;
          events.add(times[s] + (s == 0 ? " PRESENT_AT_START " : " NUCLEATED ") + id + " -1");
          if (s > 0) {
            births.add(
                new Birth(
                    times[s], site(smooth, regions.get(r), settings.seedLevel(), length)));
          }
        } else {
          continue;
        }
        now.put(id, regions.get(r));
        if (regions.get(r).size() == smooth.length && filled.add(id)) {
          events.add(times[s] + " FILLED " + id + " -1");
        }
      }
      for (int b : before.keySet().stream().sorted().toList()) {
        if (!heir.containsKey(b)) {
          events.add(times[s] + " COLLAPSED " + b + " -1");
        }
      }
      before = now;
    }
    return events;
  }

  static double[] smooth(double[] profile, double length, double sigma) {
    int n = profile.length;
    double[] result = new double[n];
    for (int i = 0; i < n; i++) {
      double sum = 0;
      double weights = 0;
      for (int j = 0; j < n; j++) {
        double d = Math.abs(i - j) * length / n;
        d = Math.min(d, length - d);
        double w = sigma == 0 ? (i == j ? 1 : 0) : Math.exp(-d * d / (2 * sigma * sigma));
        sum += w * profile[j];
        weights += w;
      }
      result[i] = sum / weights;
    }
    return result;
  }

  /** Direction of the sum of the unit vectors to all points above the seed level. */
  private static double site(
      double[] smooth, Set<Integer> region, double seedLevel, double length) {
    double x = 0;
    double y = 0;
    for (int p : region) {
      if (smooth[p] > seedLevel) {
        x += Math.cos(2 * Math.PI * p / smooth.length);
        y += Math.sin(2 * Math.PI * p / smooth.length);
      }
    }
    double turn = Math.atan2(y, x) / (2 * Math.PI);
    return (turn < 0 ? turn + 1 : turn) * length;
  }

  /** Connected sets, ordered so that the first begins after the first point below the level. */
  private static List<Set<Integer>> regions(double[] profile, double level) {
    int n = profile.length;
    int gap = 0;
    while (gap < n && profile[gap] > level) {
      gap++;
    }
    Set<Integer> done = new HashSet<>();
    List<Set<Integer>> regions = new ArrayList<>();
    for (int k = 0; k < n; k++) {
      int p = (gap + k) % n;
      if (profile[p] > level && !done.contains(p)) {
        Set<Integer> region = new HashSet<>();
        List<Integer> queue = new ArrayList<>(List.of(p));
        while (!queue.isEmpty()) {
          int q = queue.remove(queue.size() - 1);
          if (profile[q] > level && region.add(q)) {
            queue.add((q + 1) % n);
            queue.add((q + n - 1) % n);
          }
        }
        done.addAll(region);
        regions.add(region);
      }
    }
    return regions;
  }
}
