package spgpe.internal.fourier;

import org.jtransforms.fft.DoubleFFT_1D;
import spgpe.fourier.FourierProvider;
import spgpe.fourier.FourierTransform;
import spgpe.internal.check.Check;

/**
 * The built-in provider, on JTransforms' one-dimensional plans.
 *
 * <p>JTransforms hands transforms of 4096 points and more to a thread pool of its own. The library
 * promises not to start threads, so longer even transforms are halved until they are below that
 * limit, and other long sizes are refused. Transforms of power-of-two length allocate nothing; other
 * lengths allocate inside JTransforms at every call.
 */
public final class JTransformsProvider implements FourierProvider {
  private static final int FIRST_THREADED_SIZE = 4096;

  /** Made by the service loader. */
  public JTransformsProvider() {}

  @Override
  public String name() {
    return "jtransforms";
  }

  @Override
  public int rank() {
    return 0;
  }

  @Override
  public FourierTransform transform(int size) {
    Check.argument(size >= 1, "transform size must be >= 1: size=%s", size);
    if (size < FIRST_THREADED_SIZE) {
      return new Plan(size);
    }
    Check.argument(
        size % 2 == 0,
        "transforms of %s points and more must have an even number of points: size=%s; choose a"
            + " power of two", FIRST_THREADED_SIZE, size);
    return new HalvedTransform(transform(size / 2));
  }

  private static final class Plan implements FourierTransform {
    private final int size;
    private final DoubleFFT_1D plan;

    Plan(int size) {
      this.size = size;
      this.plan = new DoubleFFT_1D(size);
    }

    @Override
    public int size() {
      return size;
    }

    @Override
    public void forward(double[] data, int offset) {
      plan.complexForward(data, offset);
    }

    @Override
    public void inverse(double[] data, int offset) {
      plan.complexInverse(data, offset, false);
    }
  }
}
