package spgpe.examples.planner;

import java.util.Iterator;
import java.util.List;
import java.util.Map;

/** Writes maps, lists, strings, numbers and booleans as JSON (RFC 8259). */
final class Json {
  private final StringBuilder out = new StringBuilder();

  private Json() {}

  /**
   * The text of a value. Numbers that are not finite become null, which JSON has instead of them.
   *
   * @throws IllegalArgumentException for a value of another type
   */
  static String write(Object value) {
    Json json = new Json();
    json.value(value, "\n");
    return json.out.toString();
  }

  private void value(Object value, String line) {
    if (value instanceof Map<?, ?> map) {
      sequence("{", "}", map.entrySet(), line);
    } else if (value instanceof List<?> list) {
      sequence("[", "]", list, line);
    } else if (value instanceof Number number) {
      boolean finite = Double.isFinite(number.doubleValue());
      out.append(finite ? number.toString() : "null");
    } else if (value instanceof Boolean) {
      out.append(value);
    } else if (value instanceof CharSequence text) {
      string(text);
    } else {
      throw new IllegalArgumentException("no JSON for " + value.getClass());
    }
  }

  private void sequence(String begin, String end, Iterable<?> items, String line) {
    Iterator<?> rest = items.iterator();
    out.append(begin);
    boolean any = rest.hasNext();
    while (rest.hasNext()) {
      out.append(line).append("  ");
      Object item = rest.next();
      if (item instanceof Map.Entry<?, ?> entry) {
        string(String.valueOf(entry.getKey()));
        out.append(": ");
        value(entry.getValue(), line + "  ");
      } else {
        value(item, line + "  ");
      }
      out.append(rest.hasNext() ? "," : "");
    }
    out.append(any ? line : "").append(end);
  }

  private void string(CharSequence text) {
    out.append('"');
    for (int i = 0; i < text.length(); i++) {
      char c = text.charAt(i);
      switch (c) {
        case '"' -> out.append("\\\"");
        case '\\' -> out.append("\\\\");
        case '\n' -> out.append("\\n");
        case '\r' -> out.append("\\r");
        case '\t' -> out.append("\\t");
        default -> {
          // a lone surrogate cannot be written as UTF-8
          if (c < 0x20 || Character.isSurrogate(c)) {
            out.append(String.format("\\u%04x", (int) c));
          } else {
            out.append(c);
          }
        }
      }
    }
    out.append('"');
  }
}
