package spgpe.observables.topology;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import net.jqwik.api.constraints.DoubleRange;
import net.jqwik.api.constraints.IntRange;
import org.junit.jupiter.api.Test;
import spgpe.model.Model;
import spgpe.observables.Fields;
import spgpe.observables.density.AtomNumber;
import spgpe.observables.density.Density;
import spgpe.observables.phase.RelativePhase;
import spgpe.run.Snapshot;
import spgpe.run.TrajectoryEnd;

class TopologyTest {
  private static double kink(double x, double centre) {
    return 4 * Math.atan(Math.exp(2 * (x - centre))); // sine-Gordon kink, 0 to 2 pi
  }

  private static double[] sampled(java.util.function.DoubleUnaryOperator f) {
    double[] values = new double[400];
    for (int i = 0; i < 400; i++) {
      values[i] = f.applyAsDouble(0.1 * i);
    }
    return values;
  }

  @Test
  void kinkAndAntikinkOnARing() {
    double[] phi = sampled(x -> kink(x, 12.34) - kink(x, 31.07));
    List<Defect> found = Kinks.find(phi, 40);
    assertEquals(2, found.size());
    assertEquals(12.34, found.get(0).position(), 0.003);
    assertEquals(1, found.get(0).sign());
    assertEquals(31.07, found.get(1).position(), 0.003);
    assertEquals(-1, found.get(1).sign());
  }

  @Property(tries = 40, seed = "2026")
  void signsAddUpToTheWindingNumber(
      @ForAll @IntRange(min = -3, max = 3) int winding,
      @ForAll @DoubleRange(min = 0, max = 2.4) double wave,
      @ForAll @DoubleRange(min = 0, max = 40) double shift) {
    double[] phi =
        sampled(
            x ->
                2 * Math.PI * winding * x / 40
                    + wave * Math.sin(2 * Math.PI * 3 * (x + shift) / 40));
    int sum = 0;
    for (Defect d : Kinks.find(phi, 40)) {
      sum += d.sign();
      assertTrue(d.position() >= 0 && d.position() < 40);
    }
    assertEquals(winding, sum);
  }

  @Test
  void excursionsAndTheMetastablePlateauAreNoKinks() {
    assertEquals(0, Kinks.find(sampled(x -> 3.5 * Math.exp(-(x - 20) * (x - 20))), 40).size());
    assertEquals(0, Kinks.find(sampled(x -> Math.PI + 0.3 * Math.sin(x)), 40).size());
    // from 0 to the plateau at pi and back is no kink, from 0 over the plateau to 2 pi it is one
    assertEquals(
        0,
        Kinks.find(
                sampled(x -> Math.PI / 2 * (Math.tanh(x - 10) - Math.tanh(x - 30))), 40)
            .size());
    assertEquals(
        1,
        Kinks.find(
                sampled(x -> Math.PI / 2 * (Math.tanh(x - 10) + Math.tanh(x - 16) + 2)), 40)
            .size());
  }

  @Test
  void observableCountsKinksOfTheRelativePhase() {
    Model model = Fields.latticePair(400, 40);
    Snapshot s = Fields.withRelativePhase(model, x -> kink(x, 5) + kink(x, 15) - kink(x, 30));
    assertEquals(3, Fields.measure(Kinks.count(), s)[0]);
    assertEquals(1, Fields.measure(RelativePhase.winding(), s)[0]);
  }

  @Test
  void domainWallsWithHysteresis() {
    // S_z-like: high in (5, 25), with a ripple that crosses the middle but not the levels
    double[] z =
        sampled(x -> Math.tanh(2 * (x - 5)) - Math.tanh(2 * (x - 25)) - 1 + 0.2 * Math.sin(20 * x));
    List<Defect> walls = DomainWalls.find(z, -0.4, 0.4, 40);
    assertEquals(2, walls.size());
    Defect falling = walls.get(walls.get(1).sign() < 0 ? 1 : 0);
    assertEquals(25, falling.position(), 0.2);
    assertEquals(0, walls.get(0).sign() + walls.get(1).sign());
    assertEquals(0, DomainWalls.find(z, -2, 2, 40).size());
    double[] across = sampled(x -> Math.cos(2 * Math.PI * (x - 3) / 40)); // high across the seam
    List<Defect> seam = DomainWalls.find(across, 0, 0, 40);
    assertEquals(2, seam.size());
    assertEquals(13, seam.get(0).position(), 1e-2);
    assertEquals(33, seam.get(1).position(), 1e-2);
    Model model = Fields.latticePair(64, 40);
    Snapshot s =
        Fields.snapshot(
            model, 0,
            (c, x, v) -> v[0] = (c == 0) == (x > 10 && x < 20) ? 1 : 0.1);
    assertEquals(
        2,
        Fields.measure(DomainWalls.count(Density.spin(Density.SpinAxis.Z), -0.5, 0.5), s)[0]);
  }

  @Test
  void slipsAreListedWithTheirTrajectory() {
    PhaseSlips first = new PhaseSlips(new double[] {0, 1, 2, 3}, 2);
    first.add(0, new double[] {0, 1});
    first.add(1, new double[] {0, 1});
    first.add(2, new double[] {-1, 1});
    first.add(3, new double[] {-1, 3});
    first.finish(new TrajectoryEnd(4, 3, TrajectoryEnd.Reason.END_OF_RUN, ""));
    PhaseSlips second = new PhaseSlips(new double[] {0, 1, 2, 3}, 2);
    second.add(0, new double[] {7, 7});
    second.finish(new TrajectoryEnd(5, 3, TrajectoryEnd.Reason.END_OF_RUN, ""));
    assertEquals(
        List.of(new PhaseSlips.Slip(4, 2, 0, 0, -1), new PhaseSlips.Slip(4, 3, 1, 1, 3)),
        first.mergedWith(second).slips());
  }

  @Test
  void misuseIsNamed() {
    assertTrue(
        Fields.refusal(() -> DomainWalls.find(new double[4], 1, 0, 1))
            .contains("low=1.0, high=0.0"));
    assertTrue(
        Fields.refusal(() -> DomainWalls.find(new double[] {Double.NaN}, 0, 1, 1))
            .contains("point=0, value=NaN"));
    Model model = Fields.latticePair(16, 5);
    assertTrue(
        Fields.refusal(() -> DomainWalls.count(AtomNumber.total(), 0, 1).size(model))
            .contains("numbers=1"));
    PhaseSlips slips = new PhaseSlips(new double[] {0}, 1);
    assertTrue(Fields.refusal(() -> slips.add(0, new double[] {0.5})).contains("value=0.5"));
    assertTrue(
        Fields.refusal(() -> slips.add(0, new double[] {Double.NaN})).contains("value=NaN"));
  }
}
