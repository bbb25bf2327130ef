package spgpe.internal.fourier;

import java.util.stream.IntStream;
import spgpe.fourier.FourierProvider;
import spgpe.fourier.FourierProviderContract;
import spgpe.fourier.FourierTransform;

/** Halving, made to act at small sizes too. */
class HalvedTransformTest extends FourierProviderContract {
  private static final FourierProvider BASE = new JTransformsProvider();

  @Override
  protected FourierProvider provider() {
    return new FourierProvider() {
      @Override
      public String name() {
        return "halving";
      }

      @Override
      public int rank() {
        return 0;
      }

      @Override
      public FourierTransform transform(int size) {
        return size >= 2 && size % 2 == 0
            ? new HalvedTransform(transform(size / 2))
            : BASE.transform(size);
      }
    };
  }

  @Override
  protected int[] sizes() {
    return IntStream.concat(IntStream.rangeClosed(1, 32), IntStream.of(60, 100, 256, 1024))
        .toArray();
  }
}
