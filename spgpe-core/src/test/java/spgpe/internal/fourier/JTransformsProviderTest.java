package spgpe.internal.fourier;

import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.Test;
import spgpe.fourier.FourierProvider;
import spgpe.fourier.FourierProviderContract;

class JTransformsProviderTest extends FourierProviderContract {
  @Override
  protected FourierProvider provider() {
    return new JTransformsProvider();
  }

  @Test
  void longOddSizesAreRefusedBecauseTheyWouldStartThreads() {
    String message =
        assertThrows(IllegalArgumentException.class, () -> provider().transform(5001)).getMessage();
    assertTrue(message.contains("size=5001") && message.contains("power of two"), message);
    assertThrows(IllegalArgumentException.class, () -> provider().transform(2 * 5001));
  }
}
