package blochbound;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonToken;
import java.io.IOException;
import java.math.BigDecimal;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * A JSON value as another program reads it: {@code Map}, {@code List}, {@code String}, {@code
 * BigDecimal}, {@code Boolean}, or none.
 */
final class JsonValue {
  private final Object value;

  private JsonValue(Object value) {
    this.value = value;
  }

  /** The one value of a text. */
  static JsonValue parse(String text) throws IOException {
    try (JsonParser parser = new JsonFactory().createParser(text)) {
      parser.nextToken();
      Object value = read(parser);
      if (parser.nextToken() != null) {
        throw new IOException("more than one value in\n" + text);
      }
      return new JsonValue(value);
    }
  }

  private static Object read(JsonParser parser) throws IOException {
    return switch (parser.currentToken()) {
      case START_OBJECT -> {
        Map<String, Object> object = new LinkedHashMap<>();
        while (parser.nextToken() == JsonToken.FIELD_NAME) {
          String key = parser.currentName();
          parser.nextToken();
          if (object.putIfAbsent(key, read(parser)) != null) {
            throw new IOException("two fields " + key);
          }
        }
        yield object;
      }
      case START_ARRAY -> {
        List<Object> array = new ArrayList<>();
        while (parser.nextToken() != JsonToken.END_ARRAY) {
          array.add(read(parser));
        }
        yield array;
      }
      case VALUE_STRING -> parser.getText();
      case VALUE_NUMBER_INT, VALUE_NUMBER_FLOAT -> parser.getDecimalValue();
      case VALUE_TRUE -> true;
      case VALUE_FALSE -> false;
      case VALUE_NULL -> Map.of();
      default -> throw new IOException("unexpected " + parser.currentToken());
    };
  }

  /** A field of an object. */
  JsonValue get(String key) {
    Object field = ((Map<?, ?>) value).get(key);
    if (field == null) {
      throw new AssertionError("no field " + key + " in " + value);
    }
    return new JsonValue(field);
  }

  /** The items of an array. */
  List<JsonValue> items() {
    return ((List<?>) value).stream().map(JsonValue::new).toList();
  }

  /** The names of the fields in order. */
  List<String> keys() {
    return ((Map<?, ?>) value).keySet().stream().map(Object::toString).toList();
  }

  /** A text. */
  String text() {
    return (String) value;
  }

  /** A number with all its digits. */
  BigDecimal number() {
    return (BigDecimal) value;
  }

  /** A truth value. */
  boolean truth() {
    return (Boolean) value;
  }
}
