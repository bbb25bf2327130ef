package spgpe.statistics;

import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import org.junit.jupiter.api.function.Executable;

/** Asserts that bad input is refused with a message that names what is wrong. */
final class Messages {
  private Messages() {}

  static void assertRefused(Executable call, String... parts) {
    assertMentions(assertThrows(IllegalArgumentException.class, call), parts);
  }

  static void assertTooEarly(Executable call, String... parts) {
    assertMentions(assertThrows(IllegalStateException.class, call), parts);
  }

  private static void assertMentions(RuntimeException failure, String... parts) {
    String message = String.valueOf(failure.getMessage());
    for (String part : parts) {
      assertTrue(message.contains(part), () -> "'" + message + "' lacks '" + part + "'");
    }
  }
}
