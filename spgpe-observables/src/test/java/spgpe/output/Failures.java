package spgpe.output;

import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.UncheckedIOException;
import org.junit.jupiter.api.function.Executable;

/** Asserts that a call fails with a message that names what is wrong. */
final class Failures {
  private Failures() {}

  static void assertRefused(Executable call, String... parts) {
    assertMentions(assertThrows(IllegalArgumentException.class, call), parts);
  }

  static void assertUnwritable(Executable call, String... parts) {
    assertMentions(assertThrows(UncheckedIOException.class, call), parts);
  }

  private static void assertMentions(RuntimeException failure, String... parts) {
    String message = String.valueOf(failure.getMessage());
    for (String part : parts) {
      assertTrue(message.contains(part), () -> "'" + message + "' lacks '" + part + "'");
    }
  }
}
