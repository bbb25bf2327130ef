package spgpe.reservoir;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import spgpe.grid.Axis;
import spgpe.grid.PeriodicGrid;
import spgpe.internal.random.BoxMuller;
import spgpe.internal.random.Philox;
import spgpe.projector.Amplitudes;
import spgpe.projector.CoherentRegion;
import spgpe.projector.Projector;

class CounterBasedStreamsTest extends NoiseGeneratorContract {
  @Override
  protected RandomStreams streams(long seed) {
    return RandomStreams.counterBased(seed);
  }

  /** The layout of the counter is a promise: old results can be had again. */
  @Test
  void theCounterIsMadeOfModeStepTrajectoryAndUse() {
    long seed = 0x0123456789abcdefL;
    long step = 0x0000_beef_8765_4321L;
    CoherentRegion region = Projector.modesUpTo(3).on(PeriodicGrid.of(Axis.of(16, 2)));
    NoiseGenerator generator = streams(seed).generator(region, 2, 1);
    generator.assign(0, 0xfedcba98L);
    Amplitudes normals = new Amplitudes(region, 2, 1);
    generator.fill(step, 9, normals);
    for (int n = -3; n <= 3; n++) {
      BoxMuller.Scratch block = new BoxMuller.Scratch(1);
      block.c0[0] = n & 0xffffL;
      block.c1[0] = 0x87654321L;
      block.c2[0] = 0xfedcba98L;
      block.c3[0] = 0x0901beefL;
      Philox.encrypt(1, block.c0, block.c1, block.c2, block.c3, 0x89abcdef, 0x01234567);
      double[] re = new double[1];
      double[] im = new double[1];
      BoxMuller.normals(1, block, re, im, 0, 1);
      int m = region.indexOf(n);
      assertEquals(re[0], normals.re(1)[m], 0);
      assertEquals(im[0], normals.im(1)[m], 0);
    }
  }

  @Test
  void modeNumbersThatDoNotFitTheCounterAreRefused() {
    CoherentRegion region =
        Projector.keeping("one high mode", (nx, ny) -> nx == 32768 ? 1 : 0)
            .on(PeriodicGrid.of(Axis.of(1 << 17, 2)));
    String message =
        assertThrows(IllegalArgumentException.class, () -> streams(1).generator(region, 1, 1))
            .getMessage();
    assertTrue(message.contains("nx=32768"), message);
  }
}
