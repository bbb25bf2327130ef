package spgpe.run;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import net.jqwik.api.Arbitraries;
import net.jqwik.api.Arbitrary;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.Provide;
import org.junit.jupiter.api.Test;

/** The shape of the tree of merges, seen by an accumulator that writes it down. */
class MergeTreeTest {
  private record Shape(String text) implements Accumulator<Shape> {
    @Override
    public void add(int sample, double[] values) {
      throw new UnsupportedOperationException();
    }

    @Override
    public Shape mergedWith(Shape later) {
      return new Shape("(" + text + " " + later.text + ")");
    }
  }

  private static String shape(List<Long> indices) {
    MergeTree<Shape> tree = new MergeTree<>();
    for (long index : indices) {
      tree.add(index, new Shape(Long.toString(index)));
    }
    return tree.sum(new Shape("")).text();
  }

  @Test
  void neighboursArePairedByTheirIndices() {
    assertEquals("", shape(List.of()));
    assertEquals("((0 1) (2 3))", shape(List.of(3L, 1L, 0L, 2L)));
    assertEquals("(((0 1) (2 3)) 4)", shape(List.of(4L, 3L, 2L, 1L, 0L)));
    assertEquals("(1 (2 3))", shape(List.of(1L, 2L, 3L)));
    assertEquals("(((0 1) 3) 4)", shape(List.of(4L, 0L, 3L, 1L)));
  }

  @Property(tries = 200)
  void theShapeDependsOnTheIndicesOnly(@ForAll("orders") List<Long> order) {
    List<Long> sorted = order.stream().sorted().toList();
    assertEquals(shape(sorted), shape(order));
    int cut = order.size() / 3;
    MergeTree<Shape> one = new MergeTree<>();
    MergeTree<Shape> two = new MergeTree<>();
    for (int i = 0; i < order.size(); i++) {
      (i < cut ? one : two).add(order.get(i), new Shape(Long.toString(order.get(i))));
    }
    assertEquals(shape(sorted), two.mergedWith(one).sum(new Shape("")).text());
  }

  @Provide
  Arbitrary<List<Long>> orders() {
    return Arbitraries.longs().between(0, 100).list().uniqueElements().ofMaxSize(60);
  }
}
