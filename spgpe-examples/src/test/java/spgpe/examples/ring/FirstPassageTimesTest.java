package spgpe.examples.ring;

import java.util.List;
import spgpe.run.Accumulator;
import spgpe.run.AccumulatorContract;

/** An accumulator of one's own keeps the contract. */
class FirstPassageTimesTest extends AccumulatorContract<FirstPassageTimes> {
  @Override
  protected Accumulator.Factory<FirstPassageTimes> factory() {
    return FirstPassageTimes.through(List.of(-0.5, 0.5));
  }

  @Override
  protected List<?> contents(FirstPassageTimes passages) {
    return List.of(passages.endsAt(-0.5), passages.endsAt(0.5));
  }
}
