package spgpe.run;

import java.util.Map;
import java.util.TreeMap;

/**
 * Merges accumulators of single trajectories in a tree that depends only on their indices: the
 * accumulators of [2i 2^l, (2i+1) 2^l) and [(2i+1) 2^l, (2i+2) 2^l) are merged as soon as both are
 * there. Any order of arrival and any split into shards gives the same sums, to the last bit.
 */
final class MergeTree<A extends Accumulator<A>> {
  private record Node<A>(int level, A sum) {}

  /** Nodes by their first index. */
  private final TreeMap<Long, Node<A>> nodes = new TreeMap<>();

  void add(long index, A sum) {
    add(index, new Node<>(0, sum));
  }

  private void add(long start, Node<A> node) {
    long first = start;
    Node<A> sum = node;
    while (true) {
      long size = 1L << sum.level();
      long sibling = first ^ size;
      Node<A> other = nodes.get(sibling);
      if (other == null || other.level() != sum.level()) {
        break;
      }
      nodes.remove(sibling);
      A merged =
          sibling < first
              ? other.sum().mergedWith(sum.sum())
              : sum.sum().mergedWith(other.sum());
      first = Math.min(first, sibling);
      sum = new Node<>(sum.level() + 1, merged);
    }
    nodes.put(first, sum);
  }

  MergeTree<A> mergedWith(MergeTree<A> other) {
    MergeTree<A> union = new MergeTree<>();
    nodes.forEach(union::add);
    other.nodes.forEach(union::add);
    return union;
  }

  /** The sum of everything, or the given empty accumulator if nothing came. */
  A sum(A empty) {
    A total = empty;
    boolean first = true;
    for (Map.Entry<Long, Node<A>> entry : nodes.entrySet()) {
      A next = entry.getValue().sum();
      total = first ? next : total.mergedWith(next);
      first = false;
    }
    return total;
  }
}
