package spgpe.fourier;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.List;
import org.junit.jupiter.api.Test;

class FourierProvidersTest {
  @Test
  void theBuiltInProviderIsFoundByName() {
    assertEquals("jtransforms", FourierProviders.named("jtransforms").name());
  }

  @Test
  void thePreferredProviderIsTheFirstByRankThenName() {
    List<FourierProvider> all = FourierProviders.available();
    assertFalse(all.isEmpty());
    assertEquals(all.get(0).name(), FourierProviders.preferred().name());
    for (int i = 1; i < all.size(); i++) {
      FourierProvider better = all.get(i - 1);
      FourierProvider worse = all.get(i);
      assertTrue(
          better.rank() > worse.rank()
              || (better.rank() == worse.rank() && better.name().compareTo(worse.name()) < 0));
    }
  }

  @Test
  void anUnknownNameIsRefusedWithThoseThatExist() {
    String message =
        assertThrows(IllegalArgumentException.class, () -> FourierProviders.named("abacus"))
            .getMessage();
    assertTrue(message.contains("name=abacus") && message.contains("jtransforms"), message);
  }
}
