package spgpe.examples.planner;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertSame;
import static org.junit.jupiter.api.Assertions.assertThrows;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import net.jqwik.api.ForAll;
import net.jqwik.api.Property;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The writer against literal text and against a strict reader. */
class JsonTest {
  @Test
  void literals() {
    assertEquals("\"a\\\"b\\\\c\\nd\\u0001\u00e9\"", Json.write("a\"b\\c\nd\u0001\u00e9"));
    assertEquals("[]", Json.write(List.of()));
    assertEquals("{}", Json.write(Map.of()));
    Map<String, Object> map = new LinkedHashMap<>();
    map.put("x", 1.5);
    map.put("list", List.of(1L, true, "t"));
    assertEquals(
        "{\n  \"x\": 1.5,\n  \"list\": [\n    1,\n    true,\n    \"t\"\n  ]\n}", Json.write(map));
    assertEquals("null", Json.write(Double.POSITIVE_INFINITY));
    assertEquals("null", Json.write(Double.NaN));
    assertThrows(IllegalArgumentException.class, () -> Json.write(new Object()));
  }

  @Property(tries = 200)
  void stringsComeBack(@ForAll String text) {
    assertEquals(text, JsonReader.read(Json.write(text)));
  }

  @Property(tries = 200)
  void numbersComeBack(@ForAll double value) {
    assertEquals(value, (double) JsonReader.read(Json.write(value)));
  }

  @Test
  void nestingComesBack() {
    Map<String, Object> map = new LinkedHashMap<>();
    map.put("a \"key\"", List.of(List.of(), Map.of("k", "v"), 1e-300, false));
    map.put("unknown", Double.NaN);
    @SuppressWarnings("unchecked")
    Map<String, Object> back = (Map<String, Object>) JsonReader.read(Json.write(map));
    assertEquals(
        List.of(List.of(), Map.of("k", "v"), 1e-300, false), back.get("a \"key\""));
    assertSame(JsonReader.NULL, back.get("unknown"));
  }

  @ParameterizedTest
  @ValueSource(
      strings = {"", "{", "[1,]", "{\"a\":1,}", "01", "1.", "NaN", "'a'", "\"a", "[1] 2",
        "{\"a\":1,\"a\":2}", "\"\\x\""})
  void theReaderIsStrict(String text) {
    assertThrows(IllegalStateException.class, () -> JsonReader.read(text));
  }
}
