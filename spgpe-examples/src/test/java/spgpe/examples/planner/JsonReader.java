package spgpe.examples.planner;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/** A strict reader of JSON (RFC 8259), so that the writer is not its own judge. */
final class JsonReader {
  /** Stands for null. */
  static final Object NULL = new Object();

  private static final Pattern NUMBER =
      Pattern.compile("-?(0|[1-9][0-9]*)(\\.[0-9]+)?([eE][+-]?[0-9]+)?");

  private final String text;
  private int at;

  private JsonReader(String text) {
    this.text = text;
  }

  static Object read(String text) {
    JsonReader reader = new JsonReader(text);
    Object value = reader.value();
    reader.space();
    if (reader.at != text.length()) {
      throw reader.wrong("text after the value");
    }
    return value;
  }

  private Object value() {
    space();
    char c = peek();
    if (c == '{') {
      return object();
    }
    if (c == '[') {
      return array();
    }
    if (c == '"') {
      return string();
    }
    for (Map.Entry<String, Object> word :
        Map.of("true", true, "false", false, "null", NULL).entrySet()) {
      if (text.startsWith(word.getKey(), at)) {
        at += word.getKey().length();
        return word.getValue();
      }
    }
    Matcher number = NUMBER.matcher(text).region(at, text.length());
    if (!number.lookingAt()) {
      throw wrong("no value");
    }
    at = number.end();
    return Double.parseDouble(number.group());
  }

  private Map<String, Object> object() {
    Map<String, Object> map = new LinkedHashMap<>();
    expect('{');
    space();
    if (peek() == '}') {
      at++;
      return map;
    }
    while (true) {
      space();
      String key = string();
      space();
      expect(':');
      if (map.put(key, value()) != null) {
        throw wrong("key twice: " + key);
      }
      space();
      if (peek() == '}') {
        at++;
        return map;
      }
      expect(',');
    }
  }

  private List<Object> array() {
    List<Object> list = new ArrayList<>();
    expect('[');
    space();
    if (peek() == ']') {
      at++;
      return list;
    }
    while (true) {
      list.add(value());
      space();
      if (peek() == ']') {
        at++;
        return list;
      }
      expect(',');
    }
  }

  private String string() {
    expect('"');
    StringBuilder out = new StringBuilder();
    while (peek() != '"') {
      char c = text.charAt(at++);
      if (c < 0x20) {
        throw wrong("bare control character");
      }
      if (c != '\\') {
        out.append(c);
        continue;
      }
      char escape = peek();
      at++;
      if (escape == 'u') {
        String digits = text.substring(at, at + 4);
        if (!digits.matches("[0-9a-fA-F]{4}")) {
          throw wrong("wrong escape");
        }
        out.append((char) Integer.parseInt(digits, 16));
        at += 4;
      } else {
        int index = "\"\\/bfnrt".indexOf(escape);
        if (index < 0) {
          throw wrong("wrong escape");
        }
        out.append("\"\\/\b\f\n\r\t".charAt(index));
      }
    }
    at++;
    return out.toString();
  }

  private void space() {
    while (at < text.length() && " \t\r\n".indexOf(text.charAt(at)) >= 0) {
      at++;
    }
  }

  private char peek() {
    if (at >= text.length()) {
      throw wrong("unexpected end");
    }
    return text.charAt(at);
  }

  private void expect(char c) {
    if (peek() != c) {
      throw wrong("expected " + c);
    }
    at++;
  }

  private IllegalStateException wrong(String what) {
    return new IllegalStateException(what + " at " + at + " of " + text);
  }
}
