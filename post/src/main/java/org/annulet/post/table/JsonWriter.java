package org.annulet.post.table;

import java.util.Locale;

/**
 * Writes JSON text with two spaces of indent. Numbers are those of {@link Double#toString}, so that
 * they read back to the same bits; NaN and infinities, which JSON lacks, become null. Not
 * thread-safe.
 */
public final class JsonWriter {
  private final StringBuilder text = new StringBuilder();
  private int depth;
  private boolean first = true;

  /** Opens an object as the next value. */
  public JsonWriter object() {
    item();
    return open('{');
  }

  /** Opens an object under a key. */
  public JsonWriter object(String key) {
    return key(key).open('{');
  }

  /** Opens an array under a key. */
  public JsonWriter array(String key) {
    return key(key).open('[');
  }

  /** Closes the innermost object. */
  public JsonWriter endObject() {
    return close('}');
  }

  /** Closes the innermost array. */
  public JsonWriter endArray() {
    return close(']');
  }

  /** A number under a key. */
  public JsonWriter number(String key, double value) {
    key(key);
    text.append(format(value));
    return this;
  }

  /** A whole number under a key. */
  public JsonWriter number(String key, long value) {
    key(key);
    text.append(value);
    return this;
  }

  /** A whole number under a key, null where there is none. */
  public JsonWriter numberOrNull(String key, Integer value) {
    key(key);
    text.append(value);
    return this;
  }

  /** Numbers under a key, on one line. */
  public JsonWriter numbers(String key, double... values) {
    key(key);
    text.append('[');
    for (int i = 0; i < values.length; i++) {
      text.append(i == 0 ? "" : ", ").append(format(values[i]));
    }
    text.append(']');
    return this;
  }

  /** A text under a key. */
  public JsonWriter text(String key, String value) {
    key(key);
    text.append(quote(value));
    return this;
  }

  /** A text in an array. */
  public JsonWriter text(String value) {
    item();
    text.append(quote(value));
    return this;
  }

  /** True or false under a key. */
  public JsonWriter truth(String key, boolean value) {
    key(key);
    text.append(value);
    return this;
  }

  /** The text, ended by a new line. */
  @Override
  public String toString() {
    return text + "\n";
  }

  /** A number as JSON. */
  static String format(double value) {
    if (Double.isNaN(value) || Double.isInfinite(value)) {
      return "null";
    }
    return value == 0 ? "0.0" : Double.toString(value);
  }

  /** A text as JSON, quotes included; also safe inside a script element of HTML. */
  public static String quote(String value) {
    StringBuilder b = new StringBuilder("\"");
    for (int i = 0; i < value.length(); i++) {
      char c = value.charAt(i);
      switch (c) {
        case '"' -> b.append("\\\"");
        case '\\' -> b.append("\\\\");
        case '\n' -> b.append("\\n");
        case '\t' -> b.append("\\t");
        default -> {
          if (c < 0x20 || c == '<' || c == '>' || c == '&' || c == 0x2028 || c == 0x2029) {
            b.append(String.format(Locale.ROOT, "\\u%04x", (int) c));
          } else {
            b.append(c);
          }
        }
      }
    }
    return b.append('"').toString();
  }

  private JsonWriter key(String key) {
    item();
    text.append(quote(key)).append(": ");
    return this;
  }

  private void item() {
    if (!first) {
      text.append(',');
    }
    if (depth > 0) {
      line();
    }
    first = false;
  }

  private JsonWriter open(char c) {
    text.append(c);
    depth++;
    first = true;
    return this;
  }

  private JsonWriter close(char c) {
    depth--;
    if (!first) {
      line();
    }
    first = false;
    text.append(c);
    return this;
  }

  private void line() {
    text.append('\n').append("  ".repeat(depth));
  }
}
